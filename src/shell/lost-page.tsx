import { Empty } from '#src/components/empty.tsx';
import { KeyLink } from '#src/components/key.tsx';
import { Page, Section } from '#src/components/page.tsx';

/** An address that leads nowhere. */
export default function LostPage() {
  return (
    <Page>
      <title>No such page · Ribband</title>
      <Section title="There is no such page" level={1}>
        <Empty action={<KeyLink to="/">To your first screen</KeyLink>}>
          The address may be mistyped, or older than this version of Ribband.
        </Empty>
      </Section>
    </Page>
  );
}
