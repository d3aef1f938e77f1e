import { NotePageScreen } from '#src/routes/alongside/note/note-page.tsx';

/** The page of a photograph. */
export default function PhotoPage() {
  return <NotePageScreen entity="photo" />;
}
