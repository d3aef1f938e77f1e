import { useCallback } from 'react';

interface BlobImageProps {
  blob: Blob;
  /** What is to be seen, for somebody who does not see it. */
  alt: string;
  className?: string;
}

/** A picture that is in memory. Its address is given up when it leaves the page. */
export function BlobImage({ blob, alt, className = '' }: BlobImageProps) {
  const show = useCallback(
    (image: HTMLImageElement | null) => {
      if (!image) return;
      const url = URL.createObjectURL(blob);
      image.src = url;
      return () => URL.revokeObjectURL(url);
    },
    [blob],
  );
  return <img ref={show} alt={alt} decoding="async" className={className} />;
}
