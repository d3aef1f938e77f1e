import { NotePageScreen } from '#src/routes/alongside/note/note-page.tsx';

/** The page of a finding. */
export default function FindingPage() {
  return <NotePageScreen entity="finding" />;
}
