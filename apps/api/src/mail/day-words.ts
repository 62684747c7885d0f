const DAY = new Intl.DateTimeFormat('en-GB', { timeZone: 'UTC', day: 'numeric', month: 'long', year: 'numeric' });

/** A calendar day (yyyy-mm-dd) in words that no country reads the other way round: 4 March 2026. */
export const dayWords = (day: string): string => DAY.format(new Date(`${day}T00:00:00Z`));
