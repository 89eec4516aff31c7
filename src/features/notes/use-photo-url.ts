import { useEffect, useState } from 'react';
import { useLabClient } from '../../data/client-context';

export type PhotoUrl =
  | { readonly state: 'loading' }
  | { readonly state: 'missing' }
  | { readonly state: 'here'; readonly url: string };

/** A photo's bytes from this tablet's own store, as an address that lives as long as the picture is shown. */
export function usePhotoUrl(sha256: string): PhotoUrl {
  const { photos } = useLabClient();
  const [shown, setShown] = useState<PhotoUrl>({ state: 'loading' });
  useEffect(() => {
    let url: string | null = null;
    let gone = false;
    void photos.get(sha256).then((bytes) => {
      if (gone) return;
      if (bytes === null) {
        setShown({ state: 'missing' });
        return;
      }
      url = URL.createObjectURL(new Blob([bytes], { type: 'image/jpeg' }));
      setShown({ state: 'here', url });
    });
    return () => {
      gone = true;
      if (url !== null) URL.revokeObjectURL(url);
    };
  }, [photos, sha256]);
  return shown;
}
