/** Letters a password needs, and how many are read (NIST SP 800-63B: long, any letters, no recipe for them). */
export const passwordLength = { least: 12, most: 200 };

/** Passwords long enough that people all over choose, in lower case. */
const commonPasswords = new Set([
  'password1234',
  'password12345',
  'password123456',
  'passwordpassword',
  'passw0rdpassw0rd',
  '123456789012',
  '1234567890123',
  '123456789123',
  '123456123456',
  '0987654321098',
  'qwertyuiop12',
  'qwertyuiop123',
  'qwertyuiop[]',
  'qwerty123456',
  'qwertyqwerty',
  'qwertzuiopas',
  'asdfghjkl123',
  'asdfghjklzxc',
  '1qaz2wsx3edc',
  '1q2w3e4r5t6y',
  'zaq12wsxcde3',
  'abcdefghijkl',
  'abcdefghijklm',
  'abcd12345678',
  'abc123abc123',
  'administrator',
  'administrador',
  'letmeinplease',
  'letmein12345',
  'iloveyou1234',
  'iloveyouforever',
  'welcome12345',
  'welcome123456',
  'changeme1234',
  'changemeplease',
  'correcthorsebatterystaple',
  'teamomuchisimo',
  'contrasena123',
  'contraseña123',
  'contraseña1234',
  'haslo1234567',
  'hasło1234567',
  'polska123456',
  'matkhau12345',
  'matkhau123456',
  'anhyeuem1234',
  'trywelltrywell',
  'trywell12345',
]);

export type PasswordFault = 'too-short' | 'too-long' | 'too-common' | 'too-plain' | 'too-close';

/** With what a password is compared: who it is for. */
export interface PasswordOwner {
  email: string;
  shopName: string;
}

function fold(text: string): string {
  return text.normalize('NFKC').toLowerCase().replace(/\s+/g, '');
}

/** The letters alone: a name with a year or an exclamation mark behind it is still that name. */
function lettersOf(text: string): string {
  return fold(text).replace(/[^\p{L}]/gu, '');
}

/** Three different letters at most, or a run up or down the alphabet or the digits. */
function isPlain(password: string): boolean {
  const codes = [...password].map((letter) => letter.codePointAt(0) ?? 0);
  if (new Set(codes).size <= 3) return true;
  const steps = new Set(codes.slice(1).map((code, index) => code - (codes[index] ?? 0)));
  return steps.size === 1 && (steps.has(1) || steps.has(-1));
}

function isCloseTo(password: string, owner: PasswordOwner): boolean {
  const [mailbox = ''] = owner.email.split('@');
  return [owner.email, mailbox, owner.shopName].some((known) => {
    const letters = lettersOf(known);
    return fold(password) === fold(known) || (letters.length > 3 && lettersOf(password) === letters);
  });
}

/** What is wrong with a new password, if anything. There is no rule on which kinds of letters it must hold. */
export function findPasswordFault(password: string, owner: PasswordOwner): PasswordFault | null {
  const { length } = [...password];
  if (length < passwordLength.least) return 'too-short';
  if (length > passwordLength.most) return 'too-long';
  if (commonPasswords.has(fold(password))) return 'too-common';
  if (isPlain(fold(password))) return 'too-plain';
  return isCloseTo(password, owner) ? 'too-close' : null;
}
