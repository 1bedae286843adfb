import bcrypt from 'bcryptjs';

export interface Passwords {
  hash(password: string): Promise<string>;
  /** Takes as long for an unknown person (no hash) as for a known one, so that time tells nothing. */
  matches(password: string, hash: string | null): Promise<boolean>;
}

/** Passwords are kept as bcrypt hashes; each step of `cost` doubles the work. */
export function createPasswords(cost: number): Passwords {
  const nobody = bcrypt.hash('a password that nobody has', cost);
  return {
    hash: (password) => bcrypt.hash(password, cost),
    async matches(password, hash) {
      const same = await bcrypt.compare(password, hash ?? (await nobody));
      return hash !== null && same;
    },
  };
}
