import { useState } from 'react';
import { followAppUpdates } from '#src/app-update.ts';
import { Page, Section } from '#src/components/page.tsx';
import { TextBox } from '#src/components/text-box.tsx';
import { UpdateNotice } from '#src/components/update-notice.tsx';
import { AppUpdateContext } from '#src/components/use-update.ts';

/** A page with a real worker behind it, and words being typed while a newer version comes. */
export function UpdateScreen() {
  const [appUpdate] = useState(followAppUpdates);
  const [text, setText] = useState('');
  return (
    <Page>
      <Section title="Version" level={1}>
        <div className="grid gap-4 px-4">
          <AppUpdateContext value={appUpdate}>
            <UpdateNotice />
          </AppUpdateContext>
          <TextBox label="What you did" value={text} onChange={setText} />
        </div>
      </Section>
    </Page>
  );
}
