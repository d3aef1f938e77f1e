import { firstRunRequestSchema, type FirstRunRequest } from '#shared/identity/first-run.ts';

export type FirstRunResult = { ok: true } | { refused: string } | { offline: true };

/** What is on the form: words as typed. */
export interface FirstRunForm {
  code: string;
  shopName: string;
  timeZone: string;
  currency: string;
  units: FirstRunRequest['shop']['units'];
  name: string;
  email: string;
  password: string;
}

export type FieldProblems = Partial<Record<keyof FirstRunForm, string>>;

const FIELD_BY_PATH: Record<string, keyof FirstRunForm> = {
  code: 'code',
  'shop.name': 'shopName',
  'shop.timeZone': 'timeZone',
  'shop.currency': 'currency',
  'person.name': 'name',
  'person.email': 'email',
  'person.password': 'password',
};

const PROBLEM_WORDS: Record<keyof FirstRunForm, string> = {
  code: 'Write the code that the server printed when it started.',
  shopName: 'Write the name of the shop.',
  timeZone: 'Write a time zone such as America/New_York.',
  currency: 'Write three capitals such as USD or EUR.',
  units: 'Choose one.',
  name: 'Write your name.',
  email: 'Write a whole e-mail address.',
  password: 'At least 8 characters, and at most 72 bytes.',
};

/** The form as the request that the server reads, or what is wrong with it by field. */
export function readForm(form: FirstRunForm): { request: FirstRunRequest } | { problems: FieldProblems } {
  const { code, shopName, timeZone, currency, units, name, email, password } = form;
  const parsed = firstRunRequestSchema.safeParse({
    code: code.trim(),
    shop: { name: shopName, timeZone: timeZone.trim(), currency: currency.trim().toUpperCase(), units },
    person: { name, email, password },
  });
  if (parsed.success) return { request: parsed.data };
  const fields = parsed.error.issues.map((issue) => FIELD_BY_PATH[issue.path.join('.')]);
  return {
    problems: Object.fromEntries(fields.flatMap((field) => (field ? [[field, PROBLEM_WORDS[field]]] : []))),
  };
}

/** Makes the shop and its first foreman. */
export async function makeShop(request: FirstRunRequest): Promise<FirstRunResult> {
  let response: Response;
  try {
    response = await fetch('/api/first-run', {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify(request),
    });
  } catch (error) {
    if (error instanceof TypeError) return { offline: true };
    throw error;
  }
  return response.ok ? { ok: true } : { refused: refusalWords(response.status) };
}

function refusalWords(status: number): string {
  if (status === 403)
    return 'That is not the code that the server printed at its last start. Look at its output again.';
  if (status === 409)
    return 'There is a shop on this server already. Sign in, or ask its foreman for an account.';
  if (status === 429) return 'Too many wrong codes. Wait a few minutes and try again.';
  return `The server could not make the shop (${status}). Nothing has changed; try again.`;
}
