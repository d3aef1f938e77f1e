import bcrypt from 'bcryptjs';

const COST = 10;

// the hash of a random text that nobody knows
const DECOY = '$2b$10$C9gOcOjdiA1MtRo4yKhOSOiBFOfkJj7MVcRlWI0AVbcBbpJNg0osu';

export function hashPassword(password: string): Promise<string> {
  return bcrypt.hash(password, COST);
}

/**
 * Which of the candidates the password is right for. At least `comparisonsMin` hashes are compared, whether or not
 * there are so many candidates, so that the time taken does not tell whether there are any.
 */
export async function whoseIsThis<Candidate extends { passwordHash: string }>(
  password: string,
  candidates: Candidate[],
  comparisonsMin: number,
): Promise<Candidate[]> {
  const right: Candidate[] = [];
  for (const candidate of candidates) {
    if (await bcrypt.compare(password, candidate.passwordHash)) right.push(candidate);
  }
  for (let done = candidates.length; done < comparisonsMin; done += 1) await bcrypt.compare(password, DECOY);
  return right;
}
