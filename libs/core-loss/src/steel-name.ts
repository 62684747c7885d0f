/** What a grade's name says about the sheet. */
export interface NamedSteel {
  system: 'EN 10106' | 'JIS C 2552' | 'ASTM A677' | 'ASTM A683';
  processing: 'fully' | 'semi';
  thicknessM: number;
  maxLossWPerKg: number;
  /** The loss is stated at 1.5 T and this frequency. */
  frequencyHz: 50 | 60;
}
export type SteelNameReading = ({ outcome: 'read' } & NamedSteel) | { outcome: 'not-a-name'; words: string };

const KG_PER_LB = 0.45359237;
/** A sheet outside these, or a loss outside those, is a number that happens to look like a name. */
const THICKNESS = { least: 0.1e-3, most: 1.1e-3 };
const LOSS = { least: 1, most: 25 };

/**
 * Reads a grade's name as the bay finds it on a plate, a drawing or a coil's tag.
 *
 * `M<W/kg × 100>-<mm × 100>A` (EN), `<mm × 100>A<W/kg × 100>` (JIS), `<mm × 100>F<W/lb × 100>` (ASTM A677), `…S…` (A683, semi-processed)
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `name` | – | any text; blanks and case do not matter |
 *
 * EN names ending in K, D or E are semi-processed: their loss holds after the reference anneal only.
 *
 * @returns `read` with thickness and loss at 1.5 T, or `not-a-name` with words that say what was looked for
 *
 * Source: naming rules of EN 10106, EN 10341, JIS C 2552, ASTM A677 and A683. Standing: from memory.
 * @example
 * readSteelName('m400-50a').maxLossWPerKg
 * // → 4.00
 * readSteelName('36F155').maxLossWPerKg
 * // → 3.417
 */
export function readSteelName(name: string): SteelNameReading {
  const text = name.replace(/\s+/g, '').toUpperCase();
  const en = /^M(\d{3,4})-(\d{2,3})([AKDE])$/.exec(text);
  const jis = /^(\d{2,3})A(\d{3,4})$/.exec(text);
  const astm = /^(\d{2})([FS])(\d{3})$/.exec(text);
  const read = (steel: NamedSteel): SteelNameReading => {
    const { thicknessM, maxLossWPerKg } = steel;
    const possible = thicknessM >= THICKNESS.least && thicknessM <= THICKNESS.most && maxLossWPerKg >= LOSS.least && maxLossWPerKg <= LOSS.most;
    return possible ? { outcome: 'read', ...steel } : { outcome: 'not-a-name', words: `${name.trim()} would be a sheet that nobody rolls. Check the name.` };
  };
  const hundredth = (digits: string | undefined) => Number(digits) / 100;
  if (en) return read({ system: 'EN 10106', processing: en[3] === 'A' ? 'fully' : 'semi', thicknessM: hundredth(en[2]) / 1000, maxLossWPerKg: hundredth(en[1]), frequencyHz: 50 });
  if (jis) return read({ system: 'JIS C 2552', processing: 'fully', thicknessM: hundredth(jis[1]) / 1000, maxLossWPerKg: hundredth(jis[2]), frequencyHz: 50 });
  if (astm) {
    const semi = astm[2] === 'S';
    return read({ system: semi ? 'ASTM A683' : 'ASTM A677', processing: semi ? 'semi' : 'fully', thicknessM: hundredth(astm[1]) / 1000, maxLossWPerKg: hundredth(astm[3]) / KG_PER_LB, frequencyHz: 60 });
  }
  return { outcome: 'not-a-name', words: 'A grade is named like M400-50A, 50A400 or 36F155.' };
}
