/** Whether a new password would stand against somebody who guesses. */
import type { ZxcvbnFactory } from '@zxcvbn-ts/core';

/** Of 0 to 4: 3 stands 10^8 to 10^10 guesses, safe when the hash is slow (package's own scale, after Wheeler, USENIX Security 2016). */
export const LEAST_SCORE = 3;

/** The package with its word lists, loaded at the first use: they are large, and few requests need them. */
let loading: Promise<ZxcvbnFactory> | undefined;

/**
 * What is wrong with the password, as a sentence, or null when it is strong enough.
 * @param known what others know of the person: name, mail address, code, workshop
 */
export async function weaknessOf(password: string, known: readonly string[]): Promise<string | null> {
  const strength = await (loading ??= load());
  const words = known.flatMap((text) => [text, ...text.split(/[\s@.,_-]+/)]).filter((word) => word.length > 2);
  const { score, feedback } = strength.check(password, words);
  if (score >= LEAST_SCORE) return null;
  const why = feedback.warning ?? 'It would be guessed too soon.';
  const advice = feedback.suggestions[0] ?? 'Add a few more words that do not belong together.';
  return `This password is too weak. ${ended(why)} ${ended(advice)}`;
}

const ended = (sentence: string): string => (/[.!?]$/.test(sentence) ? sentence : `${sentence}.`);

async function load(): Promise<ZxcvbnFactory> {
  const [{ ZxcvbnFactory: Factory }, common, english] = await Promise.all([import('@zxcvbn-ts/core'), import('@zxcvbn-ts/language-common'), import('@zxcvbn-ts/language-en')]);
  return new Factory({ dictionary: { ...common.dictionary, ...english.dictionary }, graphs: common.adjacencyGraphs, translations: english.translations });
}
