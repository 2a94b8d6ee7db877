import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import type { Style } from '#shared/api/styles.ts';
import { useCan } from '#src/api/sessionStore.ts';
import { styleQueries } from '#src/api/styles.ts';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { LibraryStyleForm } from './LibraryStyleForm.tsx';
import { StyleList } from './StyleList.tsx';

/** The business's styles: the starting library to copy from, its own to edit and retire. */
export function StylesPanel() {
  const mayEdit = useCan('households.edit');
  const styles = useQuery(styleQueries.list());
  const [search, setSearch] = useSearchParams();
  if (styles.isPending) return <Loading lines={8} />;
  if (styles.isError) return <ErrorNote error={styles.error} onRetry={() => styles.refetch()} />;
  const find = (key: string) => styles.data.find(({ id }) => id === search.get(key)) ?? null;
  const back = (saved: boolean) => setSearch({}, { state: { saved } });
  const edited = find('edit');
  const copied = find('copy');
  if (mayEdit && edited?.source === 'own')
    return <LibraryStyleForm key={edited.id} style={edited} copy={false} onDone={back} />;
  if (mayEdit && copied)
    return <LibraryStyleForm key={`copy ${copied.id}`} style={copied} copy onDone={back} />;
  const open = (key: 'edit' | 'copy') => (style: Style) => setSearch({ [key]: style.id });
  return (
    <StyleList styles={styles.data} mayEdit={mayEdit} onEdit={open('edit')} onCopy={open('copy')} />
  );
}
