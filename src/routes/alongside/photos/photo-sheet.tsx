import { Link } from 'react-router-dom';
import { PhotoViewer, type ViewedPhoto } from '#src/components/photo/photo-viewer.tsx';

interface PhotoSheetProps {
  photos: ViewedPhoto[];
  shownId: string;
  onShow: (id: string) => void;
  onClose: () => void;
}

/** Photographs over the whole screen, each with the way to its own page. */
export default function PhotoSheet(props: PhotoSheetProps) {
  return (
    <PhotoViewer {...props}>
      <Link
        to={`/photo/${props.shownId}`}
        className="inline-flex min-h-key items-center underline decoration-2 underline-offset-4"
        onClick={props.onClose}
      >
        Its page
      </Link>
    </PhotoViewer>
  );
}
