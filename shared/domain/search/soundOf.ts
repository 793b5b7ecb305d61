/**
 * How a word sounds, as a short code: Double Metaphone (Lawrence Philips, C/C++ Users Journal, June 2000), primary and secondary.
 * Words that are misheard or spelled by ear get the same code: "jerk" and "jurk" are both JRK. Rules for names of Spanish and
 * Slavic origin that no movement has are left out.
 */
export function soundOf(text: string): { primary: string; secondary: string } {
  const word = text.toUpperCase().replace(/[^A-Z]/g, '');
  let primary = '';
  let secondary = '';
  let at = startOf(word);
  while (at < word.length) {
    const { step, sound, other } = soundAt(word, at);
    primary += sound;
    secondary += other ?? sound;
    at += step;
  }
  return { primary, secondary };
}

/** A first letter that is not spoken: gnat, knee, pneumatic, wrist, psoas. */
const startOf = (word: string) => (/^(?:GN|KN|PN|WR|PS)/.test(word) ? 1 : 0);

type Sound = { step: number; sound: string; other?: string };
const vowel = /[AEIOUY]/;

function soundAt(word: string, at: number): Sound {
  const letter = word[at] ?? '';
  const has = (pattern: RegExp, from = at) => from >= 0 && pattern.test(word.slice(from));
  const doubled = word[at + 1] === letter ? 2 : 1;
  const one = (sound: string, other?: string): Sound => ({ step: doubled, sound, other });
  const isVowel = (i: number) => vowel.test(word[i] ?? '');
  const before = word[at - 1] ?? '';
  const isLast = at === word.length - 1;

  switch (letter) {
    case 'B':
      return one('P');
    case 'C':
      return soundOfC(word, at, has, isVowel);
    case 'D':
      if (has(/^DG[IEY]/)) return { step: 3, sound: 'J' };
      if (has(/^DG/)) return { step: 2, sound: 'TK' };
      return { step: has(/^D[TD]/) ? 2 : 1, sound: 'T' };
    case 'G':
      return soundOfG(word, at, has, isVowel);
    case 'H':
      return (at === 0 || isVowel(at - 1)) && isVowel(at + 1) ? { step: 2, sound: 'H' } : { step: 1, sound: '' };
    case 'J':
      if (at === 0) return one('J', 'A');
      if (isVowel(at - 1) && has(/^J[AO]/)) return one('J', 'H');
      if (isLast) return one('J', '');
      return has(/^J[LTKSNMBZ]/) || /[SKL]/.test(before) ? one('') : one('J');
    case 'M': {
      const silentB = has(/^UMB(?:ER.*)?$/, at - 1);
      return { step: silentB ? 2 : doubled, sound: 'M' };
    }
    case 'P':
      if (has(/^PH/)) return { step: 2, sound: 'F' };
      return { step: has(/^P[PB]/) ? 2 : 1, sound: 'P' };
    case 'R':
      // French "-ier"
      if (isLast && has(/^IER/, at - 2) && !has(/^M[EA]/, at - 4)) return one('', 'R');
      return one('R');
    case 'S':
      return soundOfS(word, at, has, isVowel);
    case 'T':
      if (has(/^(?:TION|TIA|TCH)/)) return { step: 3, sound: 'X' };
      if (has(/^T(?:TH|H)/)) {
        if (has(/^TH[OA]M/) || /^SCH/.test(word)) return { step: 2, sound: 'T' };
        return { step: 2, sound: '0', other: 'T' };
      }
      return { step: has(/^T[TD]/) ? 2 : 1, sound: 'T' };
    case 'V':
      return one('F');
    case 'W':
      if (has(/^WR/)) return { step: 2, sound: 'R' };
      if (at === 0 && isVowel(1)) return { step: 1, sound: 'A', other: 'F' };
      if (at === 0 && has(/^WH/)) return { step: 1, sound: 'A' };
      if (isLast && isVowel(at - 1)) return { step: 1, sound: '', other: 'F' };
      return { step: 1, sound: '' };
    case 'X': {
      if (at === 0) return { step: 1, sound: 'S' };
      const silent = isLast && (has(/^[IE]AU/, at - 3) || has(/^[AO]U/, at - 2));
      return { step: has(/^X[CX]/) ? 2 : 1, sound: silent ? '' : 'KS' };
    }
    case 'Z':
      if (has(/^ZH/)) return { step: 2, sound: 'J' };
      return one('S', has(/^ZZ[OIA]/) ? 'TS' : 'S');
    case 'Q':
      return one('K');
    case 'F':
    case 'K':
    case 'L':
    case 'N':
      return one(letter);
    default:
      return { step: 1, sound: at === 0 ? 'A' : '' };
  }
}

type Has = (pattern: RegExp, from?: number) => boolean;
type IsVowel = (at: number) => boolean;

function soundOfC(word: string, at: number, has: Has, isVowel: IsVowel): Sound {
  const germanic =
    at > 1 &&
    !isVowel(at - 2) &&
    has(/^ACH(?!I)(?:[^E]|$|E(?=R))/, at - 1) &&
    (!has(/^ACHE/, at - 1) || has(/^[BM]ACHER/, at - 2));
  if (germanic) return { step: 2, sound: 'K' };
  if (at === 0 && has(/^CAESAR/)) return { step: 2, sound: 'S' };
  if (has(/^CHIA/)) return { step: 2, sound: 'K' };
  if (has(/^CH/)) return soundOfCh(word, at, has);
  if (has(/^CZ/) && !has(/^WICZ/, at - 2)) return { step: 2, sound: 'S', other: 'X' };
  if (has(/^CCIA/)) return { step: 4, sound: 'X' };
  if (has(/^CC/) && !(at === 1 && word[0] === 'M')) {
    if (!has(/^CC[IEH]/) || has(/^CCHU/)) return { step: 2, sound: 'K' };
    return { step: 3, sound: (at === 1 && word[0] === 'A') || has(/^UCC(?:EE|ES)/, at - 1) ? 'KS' : 'X' };
  }
  if (has(/^C[KGQ]/)) return { step: 2, sound: 'K' };
  if (has(/^C(?:IO|IE|IA)/)) return { step: 2, sound: 'S', other: 'X' };
  if (has(/^C[IEY]/)) return { step: 2, sound: 'S' };
  return { step: has(/^C[CKQ](?![EI])/) ? 2 : 1, sound: 'K' };
}

function soundOfCh(word: string, at: number, has: Has): Sound {
  if (at > 0 && has(/^CHAE/)) return { step: 2, sound: 'K', other: 'X' };
  const greekStart = at === 0 && has(/^CH(?:ARAC|ARIS|OR(?!E)|YM|IA|EM)/);
  const germanic =
    /^SCH/.test(word) ||
    has(/^(?:ORCHES|ARCHIT|ORCHID)/, at - 2) ||
    has(/^CH[TS]/) ||
    ((at === 0 || has(/^[AOUE]/, at - 1)) && has(/^CH(?:[LRNMBHFVW]|$)/));
  if (greekStart || germanic) return { step: 2, sound: 'K' };
  if (at === 0) return { step: 2, sound: 'X' };
  return /^MC/.test(word) ? { step: 2, sound: 'K' } : { step: 2, sound: 'X', other: 'K' };
}

function soundOfG(word: string, at: number, has: Has, isVowel: IsVowel): Sound {
  if (has(/^GH/)) {
    if (at > 0 && !isVowel(at - 1)) return { step: 2, sound: 'K' };
    if (at === 0) return { step: 2, sound: has(/^GHI/) ? 'J' : 'K' };
    const silent = has(/^[BHD]/, at - 2) || has(/^[BHD]/, at - 3) || has(/^[BH]/, at - 4);
    if (silent) return { step: 2, sound: '' };
    if (has(/^[CGLRT].U/, at - 3)) return { step: 2, sound: 'F' };
    return { step: 2, sound: word[at - 1] === 'I' ? '' : 'K' };
  }
  if (has(/^GN/)) {
    if (at === 1 && isVowel(0)) return { step: 2, sound: 'KN', other: 'N' };
    return has(/^GNE?Y/) ? { step: 2, sound: 'KN' } : { step: 2, sound: 'N', other: 'KN' };
  }
  if (has(/^GLI/)) return { step: 2, sound: 'KL', other: 'L' };
  if (at === 0 && has(/^G(?:Y|E[SPBLYIR]|I[BLNE])/)) return { step: 2, sound: 'K', other: 'J' };
  const hardEr =
    has(/^G(?:ER|Y)/) && !/^(?:DANGER|RANGER|MANGER)/.test(word) && !has(/^[EI]/, at - 1) && !has(/^[RO]GY/, at - 1);
  if (hardEr) return { step: 2, sound: 'K', other: 'J' };
  if (has(/^G[EIY]/) || has(/^[AO]GGI/, at - 1)) {
    if (/^SCH/.test(word) || has(/^GET/)) return { step: 2, sound: 'K' };
    return has(/^GIER$/) ? { step: 2, sound: 'J' } : { step: 2, sound: 'J', other: 'K' };
  }
  return { step: has(/^GG/) ? 2 : 1, sound: 'K' };
}

function soundOfS(word: string, at: number, has: Has, isVowel: IsVowel): Sound {
  if (has(/^[IY]SL/, at - 1)) return { step: 1, sound: '' };
  if (at === 0 && has(/^SUGAR/)) return { step: 1, sound: 'X', other: 'S' };
  if (has(/^SH/)) return { step: 2, sound: has(/^SH(?:EIM|OEK|OLM|OLZ)/) ? 'S' : 'X' };
  if (has(/^SI[OA]/)) return { step: 3, sound: 'S', other: 'X' };
  if ((at === 0 && has(/^S[MNLW]/)) || has(/^SZ/)) return { step: has(/^SZ/) ? 2 : 1, sound: 'S', other: 'X' };
  if (has(/^SC/)) {
    if (has(/^SCH(?:ER|EN)/)) return { step: 3, sound: 'X', other: 'SK' };
    if (has(/^SCH(?:OO|UY|ED|EM)/)) return { step: 3, sound: 'SK' };
    if (has(/^SCH/))
      return at === 0 && !isVowel(3) && word[3] !== 'W' ? { step: 3, sound: 'X', other: 'S' } : { step: 3, sound: 'X' };
    return has(/^SC[IEY]/) ? { step: 3, sound: 'S' } : { step: 3, sound: 'SK' };
  }
  const silent = at === word.length - 1 && has(/^[AO]I/, at - 2);
  return { step: has(/^S[SZ]/) ? 2 : 1, sound: silent ? '' : 'S', other: 'S' };
}
