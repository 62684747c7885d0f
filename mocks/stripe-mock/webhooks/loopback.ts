/** The fake speaks to this machine only: an address anywhere else is refused before anything is sent. */
export function isLoopback(address: string): boolean {
  if (!URL.canParse(address)) return false;
  const host = new URL(address).hostname;
  return host === 'localhost' || host === '[::1]' || /^127\.\d+\.\d+\.\d+$/.test(host);
}
