/** What the scripts tell the person at the terminal. */
export const say = (words) => process.stdout.write(`${words}\n`);
export const step = (words) => say(`\n— ${words}`);

export function giveUp(words, code = 1) {
  process.stderr.write(`\n${words}\n`);
  process.exit(code);
}
