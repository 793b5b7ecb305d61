import { editLikeness } from './editDistance';
import { soundOf } from './soundOf';
import { shareOf, trigramsOf } from './trigrams';

/** Below this two texts have nothing to do with each other. Source: measured with made-up queries, as are the weights. */
export const leastLikeness = 0.55;
const weight = { spelled: 0.3, typed: 0.35, sound: 0.35 };

/** With fewer trigrams in common, typing and sound can hardly make up for it. */
const leastShare = 0.15;
/** Counting edits is what costs time: the closest few hold the answer. */
const mostCompared = 32;

/** Texts to be found by likeness: how they are spelled (trigrams), typed (edits) and heard (sound). */
export class LikenessIndex {
  readonly #texts: string[] = [];
  readonly #gramCounts: number[] = [];
  readonly #byGram = new Map<string, number[]>();
  /** worked out when first compared: most names never are */
  readonly #sounds = new Map<number, string>();
  /** how many trigrams each text shares with the one that is asked for; all 0 between two questions */
  #shared = new Uint8Array(0);

  /** @returns the text's place, which `nearest` gives back */
  add(text: string): number {
    const grams = trigramsOf(text);
    const place = this.#texts.push(text) - 1;
    this.#gramCounts.push(grams.size);
    for (const gram of grams) {
      const places = this.#byGram.get(gram);
      if (places) places.push(place);
      else this.#byGram.set(gram, [place]);
    }
    return place;
  }

  /** The places of what is at least `leastLikeness` alike, among the texts that share the most trigrams, best first. */
  nearest(text: string): { place: number; likeness: number }[] {
    const grams = trigramsOf(text);
    const sound = soundOf(text).primary;
    return this.#sharing(grams)
      .map(({ place, share }) => ({ place, likeness: this.#likeness(text, sound, place, share) }))
      .filter(({ likeness }) => likeness >= leastLikeness)
      .sort((a, b) => b.likeness - a.likeness);
  }

  #sharing(grams: ReadonlySet<string>): { place: number; share: number }[] {
    if (this.#shared.length < this.#texts.length) this.#shared = new Uint8Array(this.#texts.length);
    const shared = this.#shared;
    const touched: number[] = [];
    for (const gram of grams) {
      for (const place of this.#byGram.get(gram) ?? []) {
        if (shared[place] === 0) touched.push(place);
        shared[place] = Math.min(255, (shared[place] ?? 0) + 1);
      }
    }
    const found: { place: number; share: number }[] = [];
    for (const place of touched) {
      const share = shareOf(shared[place] ?? 0, grams.size, this.#gramCounts[place] ?? 0);
      shared[place] = 0;
      if (share >= leastShare) found.push({ place, share });
    }
    return found.sort((a, b) => b.share - a.share).slice(0, mostCompared);
  }

  #likeness(asked: string, askedSound: string, place: number, share: number): number {
    const text = this.#texts[place] ?? '';
    // a difference in length is the least that must be typed: no need to count edits where that is too much already
    const typedAtBest = Math.min(asked.length, text.length) / Math.max(asked.length, text.length);
    if (weight.spelled * share + weight.typed * typedAtBest + weight.sound < leastLikeness) return 0;
    const typed = editLikeness(asked, text);
    if (weight.spelled * share + weight.typed * typed + weight.sound < leastLikeness) return 0;
    return (
      weight.spelled * share + weight.typed * typed + weight.sound * editLikeness(askedSound, this.#soundAt(place))
    );
  }

  #soundAt(place: number): string {
    const known = this.#sounds.get(place);
    if (known !== undefined) return known;
    const sound = soundOf(this.#texts[place] ?? '').primary;
    this.#sounds.set(place, sound);
    return sound;
  }
}
