import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, expect, test } from 'vitest';
import type { Units } from '#shared/measure/length.ts';
import { Fractions } from '#src/components/fractions.tsx';
import { LengthPad } from '#src/components/length-pad.tsx';
import { Length } from '#src/components/length.tsx';

afterEach(cleanup);
const user = userEvent.setup();

function Pad({ units }: { units: Units }) {
  const [mm, setMm] = useState<number | undefined>(undefined);
  return (
    <>
      <output>{mm === undefined ? 'nothing' : <Length mm={mm} units={units} />}</output>
      <LengthPad label="Length" units={units} mm={mm} onChange={setMm} />
    </>
  );
}

async function press(...names: string[]): Promise<string> {
  for (const name of names) await user.click(screen.getByRole('button', { name }));
  return screen.getByRole('status').textContent ?? '';
}

test('inches are figures and a fraction, to the sixteenth, in any order', async () => {
  render(<Pad units="imperial" />);
  expect(await press('3/4')).toBe('3/4 in');
  expect(await press('1', '1')).toBe('11 3/4 in');
  expect(await press('and 1/16')).toBe('11 13/16 in');
  expect(await press('and 1/16', '3/4')).toBe('11 in');
  expect(await press('Last figure away', '1/8')).toBe('1 1/8 in');
  expect(await press('Clear')).toBe('nothing');
});

test('millimetres are figures alone, and never more than the record takes', async () => {
  render(<Pad units="metric" />);
  expect(await press('2', '9', '8')).toBe('298 mm');
  expect(screen.queryByRole('button', { name: '1/2' })).toBeNull();
  expect(await press('0', '0', '0', '0')).toBe('29800 mm');
});

test('a fraction in a text is drawn, and nothing else of it', () => {
  const { container } = render(<Fractions text="11 3/4 in long, frames 3/4 of the way, 1/16 in deep" />);
  expect(container.textContent).toBe('11 3/4 in long, frames 3/4 of the way, 1/16 in deep');
  expect([...container.querySelectorAll('.frac')].map(({ textContent }) => textContent)).toEqual([
    '3/4',
    '1/16',
  ]);
});
