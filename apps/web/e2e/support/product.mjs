// Where the product under test is, and what the journeys share about it.
export const ORIGIN = process.env.PROOFPLATE_ORIGIN ?? 'http://localhost:3000';
const MAIL = process.env.PROOFPLATE_MAIL;
const LETTER_LIMIT_MS = 30_000;

/** The newest letter to an address whose subject matches; waits for the worker to send it. */
export async function letterTo(address, subject) {
  const deadline = Date.now() + LETTER_LIMIT_MS;
  while (Date.now() < deadline) {
    const letters = await (await fetch(`${MAIL}/letters.json`)).json();
    const found = letters.find((letter) => JSON.stringify(letter.to).includes(address) && subject.test(letter.subject));
    if (found) return found;
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
  throw new Error(`no letter to ${address} about ${subject}`);
}

/** The first address in a letter's text that leads to the product. */
export function linkIn(letter) {
  const link = /https?:\/\/\S+/.exec(letter.text)?.[0];
  if (!link) throw new Error(`no link in: ${letter.text}`);
  return link;
}
