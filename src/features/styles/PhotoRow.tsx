import { useId, useRef, useState } from 'react';
import type { PetStyle } from '#shared/api/petStyles.ts';
import { mostPhotosPerVersion, type Photo } from '#shared/api/photos.ts';
import { useAddPhoto, useRemovePhoto } from '#src/api/petStyles.ts';
import { Button } from '#src/components/Button.tsx';
import { ConfirmDialog } from '#src/components/ConfirmDialog.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { toast } from '#src/components/toast.ts';
import { dayWords } from '#src/lib/dayWords.ts';
import { errorWords } from '#src/lib/errorWords.ts';
import { writeCount } from '#src/lib/words.ts';
import { shrinkPhoto } from './shrinkPhoto.ts';

/** Photos of one version: small ones to open, add more, take one away. */
export function PhotoRow({
  petName,
  version,
  mayAdd,
  mayRemove,
  timeZone,
  today,
}: {
  petName: string;
  version: PetStyle;
  mayAdd: boolean;
  mayRemove: boolean;
  timeZone: string;
  today: string;
}) {
  const [shown, setShown] = useState<Photo | null>(null);
  const [removing, setRemoving] = useState<Photo | null>(null);
  const remove = useRemovePhoto();
  const { photos } = version;
  const words = (photo: Photo, index: number) =>
    `Photo ${index + 1} of ${petName}, version ${version.version}, ${dayWords(photo.takenAt, timeZone, today)}`;
  const wordsOf = (photo: Photo) => words(photo, photos.indexOf(photo));
  if (photos.length === 0 && !mayAdd) return null;
  return (
    <div className="mt-2">
      {photos.length > 0 && (
        <ul className="mb-2 flex flex-wrap gap-2">
          {photos.map((photo, index) => (
            <li key={photo.id}>
              <button
                type="button"
                onClick={() => setShown(photo)}
                className="block overflow-hidden rounded-[10px] border border-fawn"
              >
                <img
                  src={photo.url}
                  alt={words(photo, index)}
                  loading="lazy"
                  className="size-22 object-cover"
                />
              </button>
            </li>
          ))}
        </ul>
      )}
      {mayAdd && photos.length < mostPhotosPerVersion && <PhotoPicker version={version} />}
      {shown && (
        <Dialog
          title={wordsOf(shown)}
          wide
          onClose={() => setShown(null)}
          actions={
            <>
              <Button onClick={() => setShown(null)}>Close</Button>
              {mayRemove && (
                <Button
                  kind="danger"
                  onClick={() => {
                    setRemoving(shown);
                    setShown(null);
                  }}
                >
                  Remove this photo
                </Button>
              )}
            </>
          }
        >
          <img
            src={shown.url}
            width={shown.width}
            height={shown.height}
            alt={wordsOf(shown)}
            className="mx-auto h-auto max-h-[70dvh] w-auto max-w-full rounded-[10px]"
          />
        </Dialog>
      )}
      {removing && (
        <ConfirmDialog
          title="Remove this photo?"
          confirm="Remove the photo"
          keep="Keep it"
          busy={remove.isPending}
          error={remove.error}
          onConfirm={() =>
            remove.mutate(
              { params: { photoId: removing.id } },
              {
                onSuccess: () => {
                  setRemoving(null);
                  toast('The photo is removed.');
                },
              },
            )
          }
          onClose={() => setRemoving(null)}
        >
          {wordsOf(removing)}. It cannot be brought back.
        </ConfirmDialog>
      )}
    </div>
  );
}

/** Takes photos from the camera or the files, makes them small and sends them one by one. */
function PhotoPicker({ version }: { version: PetStyle }) {
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const add = useAddPhoto();
  const [sending, setSending] = useState<{ at: number; of: number; share: number } | null>(null);
  const [failed, setFailed] = useState<string | null>(null);
  const send = async (files: readonly File[]) => {
    setFailed(null);
    const room = mostPhotosPerVersion - version.photos.length;
    const chosen = files.slice(0, room);
    let sent = 0;
    try {
      for (const [index, file] of chosen.entries()) {
        setSending({ at: index + 1, of: chosen.length, share: 0 });
        const small = await shrinkPhoto(file);
        await add.mutateAsync({
          petId: version.petId,
          version: version.version,
          file: small,
          onShare: (share) => setSending({ at: index + 1, of: chosen.length, share }),
        });
        sent += 1;
      }
      if (files.length > room)
        setFailed(`A version keeps ${mostPhotosPerVersion} photos; the others were not sent.`);
    } catch (error) {
      setFailed(errorWords(error));
    } finally {
      setSending(null);
      if (input.current) input.current.value = '';
      if (sent > 0) toast(`${writeCount(sent, 'photo')} added.`);
    }
  };
  return (
    <div>
      <input
        ref={input}
        id={id}
        type="file"
        accept="image/*"
        multiple
        className="sr-only"
        tabIndex={-1}
        aria-label={`Photos for version ${version.version}`}
        onChange={(event) => void send([...(event.target.files ?? [])])}
      />
      <Button
        size="small"
        busy={sending !== null}
        busyWords={sending ? `Sending ${sending.at} of ${sending.of}` : 'Sending'}
        onClick={() => input.current?.click()}
      >
        Add photos
      </Button>
      {sending && (
        <progress
          value={sending.share}
          max={1}
          aria-label={`Photo ${sending.at} of ${sending.of}`}
          className="ml-3 h-2 w-32 accent-collar"
        />
      )}
      <p role="status" className="text-sm font-medium text-rosette">
        {failed && `▲ ${failed}`}
      </p>
    </div>
  );
}
