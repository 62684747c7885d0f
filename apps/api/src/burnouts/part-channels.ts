/** Words by which shops call what hangs in the oven rather than on the part. */
const NOT_ON_THE_PART = /\b(air|chamber|oven|furnace|burner|after-?burner|flue|stack|exhaust|smoke|ambient|room|set ?-?point|sp|luft|kammer|ofen|abgas|raum|sollwert)\b/i;

/** A first guess at which thermocouples sat on the parts; the technician sees it and puts it right. */
export function guessPartChannels(names: readonly string[]): string[] {
  return names.filter((name) => !NOT_ON_THE_PART.test(name.replaceAll('_', ' ')));
}
