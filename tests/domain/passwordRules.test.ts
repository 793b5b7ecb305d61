import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { passwordFault } from '../../server/services/passwordRules';

const own = ['ilva.marten@mail.example', 'Ilva Marten', 'Quayside Loft'];

// ASVS 5.0 6.2.4: passwords that are tried first are refused
describe('passwordFault', () => {
  it.each([
    ['one character', 'aaaaaaaaaaaaaaaaaaaa'],
    ['a repeated word', 'kettlekettlekettle'],
    ['a repeated word that is cut off', 'kettlekettlekett'],
    ['digits in a row', '123456789012345678'],
    ['digits backwards', '987654321098765432'],
    ['a row of keys and digits', 'qwertyuiop123456789'],
    ['columns of keys', '1qaz2wsx3edc4rfv'],
    ['usual words', 'passwordpassword1'],
    ['usual words in disguise', 'P@ssw0rd-Welc0me-2024'],
    ['usual words with a row of keys', 'letmeinletmein!!qwerty'],
    ['the product and a year', 'Tapeline-Tapeline-2026'],
    ['the person’s name', 'ilvamarten-ilva-marten-1'],
    ['the person’s address', 'ilva.marten@mail.example'],
    ['the team’s name', 'Quayside Loft welcome 1'],
  ])('refuses %s', (_what, password) => {
    expect(password.length).toBeGreaterThanOrEqual(15);
    expect(passwordFault(password, own)).toEqual(expect.any(String));
  });

  it.each([
    'seven quiet lamps on a shelf',
    'grub-otter-violin-74',
    'ein leises Fenster im Regen',
    '七つの静かなランプが棚の上にある夜の部屋',
    'password of the otters by the river',
    'x9!kTq_w2#Lm8@pZ',
  ])('takes %s', (password) => {
    expect(passwordFault(password, own)).toBeUndefined();
  });

  it('asks for no kinds of characters (ASVS 5.0 6.2.5): random lower-case letters do', () => {
    fc.assert(
      fc.property(
        fc
          .array(fc.constantFrom(...'bcdfghjkmnprstvz'), { minLength: 24, maxLength: 60 })
          .map((letters) => letters.join('')),
        (password) => new Set(password).size < 8 || passwordFault(password, []) === undefined,
      ),
    );
  });

  it('refuses whatever is only said twice or more', () => {
    fc.assert(
      fc.property(
        fc.string({ minLength: 4, maxLength: 14 }),
        fc.integer({ min: 4, max: 8 }),
        (unit, times) => passwordFault(unit.repeat(times), []) !== undefined,
      ),
    );
  });
});
