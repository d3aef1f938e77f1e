import { useState } from 'react';
import { Choice } from '#src/components/choice.tsx';
import { chooseSet, readChosenSet } from '#src/components/colour-set.ts';

const OPTIONS = [
  { value: 'system', label: 'As the device has it' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark', note: 'for evenings' },
  { value: 'sunlight', label: 'Sunlight', note: 'black on white, for outdoors' },
] as const;

/** The colours of this device, for the person's own page. */
export function SetChoice() {
  const [set, setSet] = useState(readChosenSet);
  return (
    <Choice
      label="Colours on this device"
      options={OPTIONS}
      value={set}
      onChange={(chosen) => {
        chooseSet(chosen);
        setSet(chosen);
      }}
    />
  );
}
