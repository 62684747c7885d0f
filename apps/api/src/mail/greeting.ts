export const greeting = (contactName: string): string => (contactName ? `Good day ${contactName},` : 'Good day,');
