/**
 * Passwords that a guesser tries first. The lists are from memory: words, names, key runs and endings that turn up
 * again and again in published leaks; no published list is copied. Composed, they give several thousand entries.
 */

const WORDS =
  `password passwort passwd pass secret welcome letmein login admin administrator master access user guest
test testing default changeme temp hello trustno iloveyou love lovely loveme sweet sweetheart princess queen king
prince angel heaven devil dragon monkey tiger lion eagle bear wolf panther shark dolphin horse rabbit kitty cat dog
puppy chicken butterfly sunshine sunflower flower rainbow summer winter spring autumn shadow midnight star stars
starwars superman batman spiderman pokemon mario naruto matrix phoenix merlin wizard magic fantasy hunter ranger
ninja samurai warrior killer soldier general captain pirate cowboy football soccer baseball basketball hockey golf
tennis runner racing yankees cowboys lakers eagles steelers liverpool chelsea arsenal barcelona madrid juventus
michael jordan jennifer jessica michelle ashley amanda nicole daniel andrew thomas robert william richard charlie
george maggie buster ginger pepper cookie chocolate cheese banana orange apple cherry lemon coffee whiskey computer
internet google facebook samsung microsoft windows linux server network system database root oracle cisco pussycat
mustang ferrari porsche mercedes corvette harley yamaha freedom forever friends family mother father brother sister
baby lucky money silver golden diamond crystal purple yellow black white green blue red jesus christ blessed faith
hope grace peace happy smile music guitar metallica nirvana blink london paris berlin texas dallas chicago boston
america canada australia germany england france qwerty qwertz azerty asdfgh zxcvbn qazwsx abc abcdef correct battery
staple`.split(/\s+/);

/** The product's own words and those of its trade that anybody would guess first here. */
const OWN_WORDS =
  `siltlight silt light scientist steward modeller dust aerosol forcing glacial icecore climate
estimate holdings intake slices optics ledger demo example`.split(/\s+/);

/** Runs on a keyboard, in the alphabet and among the digits; each is known backwards, too. */
const RUNS = [
  'qwertyuiop',
  'qwertzuiop',
  'azertyuiop',
  'asdfghjkl',
  'zxcvbnm',
  'yxcvbnm',
  'abcdefghijklmnopqrstuvwxyz',
].concat(['01234567890', '1q2w3e4r5t6y7u8i9o0p', '1qaz2wsx3edc4rfv5tgb6yhn7ujm', 'qazwsxedcrfvtgbyhnujm']);

const ENDINGS = [
  '',
  '1',
  '12',
  '123',
  '1234',
  '12345',
  '123456',
  '123456789',
  '1!',
  '123!',
  '!',
  '!!',
  '0',
  '00',
  '007',
].concat(['01', '11', '69', '88', '99', '111', '666', '777', '2000', '2020', '2023', '2024', '2025', '2026']);

export const COMMON_WORDS: ReadonlySet<string> = new Set([...WORDS, ...OWN_WORDS]);
export const KEY_RUNS: readonly string[] = RUNS.flatMap((run) => [run, [...run].reverse().join('')]);

/** Every word with every ending, and every word doubled, in lower case. */
export const COMMON_PASSWORDS: ReadonlySet<string> = new Set(
  [...COMMON_WORDS].flatMap((word) => [
    ...ENDINGS.map((ending) => word + ending),
    word + word,
    word + word + word,
  ]),
);
