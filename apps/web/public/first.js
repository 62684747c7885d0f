/* Runs before every module of the page; a file of its own, since the page's policy forbids scripts within it. */

// Zod tries whether it may compile its checks as soon as a contract is made. The policy forbids that too, and the
// browser would report the try as an error: tell it not to.
globalThis.__zod_globalConfig = { jitless: true };

// Before it is known who sits there: the theme this device showed last, so that a dim bay sees no white flash.
{
  const kept = localStorage.getItem('loopbay.theme');
  const dark = kept === 'dark' || (kept !== 'light' && matchMedia('(prefers-color-scheme: dark)').matches);
  document.body.classList.toggle('bp6-dark', dark);
}
