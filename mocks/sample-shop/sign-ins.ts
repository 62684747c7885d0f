/** The people of the sample shop. All invented. */
export const DEMO_PASSWORD = 'copper and patience';

export const SIGN_INS = [
  { role: 'counter', name: 'Ilse Brandmeier', email: 'counter@kupferring.example' },
  { role: 'technician', name: 'Jonas Feldt', email: 'technician@kupferring.example' },
  { role: 'office', name: 'Karin Osterloh', email: 'office@kupferring.example' },
  { role: 'manager', name: 'Rolf Steenbeck', email: 'manager@kupferring.example' },
  { role: 'customer', name: 'Anneke Voss', email: 'voss@senngrund.example' },
] as const;

/** Works beside the first one and releases what he has tested. */
export const SECOND_TECHNICIAN = { role: 'technician', name: 'Mira Talvik', email: 'talvik@kupferring.example' } as const;
