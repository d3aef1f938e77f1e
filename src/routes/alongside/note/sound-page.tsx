import { NotePageScreen } from '#src/routes/alongside/note/note-page.tsx';

/** The page of a thing found sound. */
export default function SoundPage() {
  return <NotePageScreen entity="sound" />;
}
