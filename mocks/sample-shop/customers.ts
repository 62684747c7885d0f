const customer = (name: string, contactName: string, email: string, postcode: string, city: string, more: object = {}) => ({
  name,
  contactName,
  email,
  phone: '',
  addressLine1: '',
  addressLine2: '',
  postcode,
  city,
  country: 'DE',
  taxNumber: '',
  ...more,
});

/** All invented: names, places, addresses. */
export const CUSTOMERS = {
  quarry: customer('Steinmar Quarry & Lime', 'Harro Steinmar', 'werkstatt@steinmar.example', '99901', 'Kalkenrode', { addressLine1: 'Bruchweg 1', phone: '+49 361 0000 501' }),
  sawmill: customer('Fennholt Sawmills', 'Gesa Fennholt', 'technik@fennholt.example', '99902', 'Fennholt', { addressLine1: 'Mühlendamm 7', phone: '+49 361 0000 502' }),
  water: customer('Oberau Water Board', 'Dr. Tilo Marx', 'pumpen@oberau.example', '99903', 'Oberau'),
  mill: customer('Tiefental Rolling Mill', 'Birte Ohlsen', 'antriebe@tiefental.example', '99904', 'Tiefental'),
  scrap: customer('Rostwerk Scrap Yard', 'Enno Rost', 'enno@rostwerk.example', '99905', 'Hafenrode'),
  energy: customer('Lindhafen Heat & Power', 'Nele Brandt', 'instandhaltung@lindhafen.example', '99906', 'Lindhafen'),
  paper: customer('Murgen Paperboard', 'Søren Łukasik', 'pm2@murgen.example', '99907', 'Murgen'),
  bakery: customer('Holmbake Bakeries', 'Ute Holm', 'ofen@holmbake.example', '99908', 'Holmstadt'),
  packaging: customer('Pakkarin Packaging', 'Timo Pakkarinen', 'maintenance@pakkarin.example', '99909', 'Pakendorf'),
  dairy: customer('Senngrund Dairy', 'Anneke Voss', 'voss@senngrund.example', '99910', 'Senngrund', { addressLine1: 'Alpweg 3', phone: '+49 361 0000 510' }),
  port: customer('Hafenkai Bulk Terminal', 'Dörte Kai', 'krane@hafenkai.example', '99911', 'Hafenkai'),
  plastics: customer('Corvel Plastics', 'Jan Corvel', 'extruder@corvel.example', '99912', 'Corvelde'),
} as const;
export type CustomerKey = keyof typeof CUSTOMERS;

/** Terms that are not the usual thirty days on account. */
export const TERMS: Partial<Record<CustomerKey, { terms: 'prepayment' | 'account'; netDays: number; creditStop: boolean }>> = {
  packaging: { terms: 'account', netDays: 30, creditStop: true },
  bakery: { terms: 'prepayment', netDays: 0, creditStop: false },
};
