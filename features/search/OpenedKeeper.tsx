import { usePathname } from 'expo-router';
import { useEffect } from 'react';
import { rememberOpened } from '@/features/call/openedPages';
import { useRoom } from '@/hooks/useRoom';
import { isId } from '@/shared/ids';
import { THINGS } from '@/shared/search/contract';
import { LOOKS } from './things';

/** Remembers on this device which pages were opened, for the search to begin with. */
export function OpenedKeeper() {
  const { accountId, id } = useRoom();
  const page = pageOf(usePathname());
  useEffect(() => {
    if (page) rememberOpened({ accountId, id }, page);
  }, [accountId, id, page]);
  return null;
}

/** "brood:<id>" of /r/<room>/broods/<id> and the pages below it. */
function pageOf(pathname: string): string | null {
  const [, , , folder, id = ''] = pathname.split('/');
  const thing = THINGS.find((one) => LOOKS[one].folder === folder);
  if (!thing) return null;
  const known = thing === 'species' ? /^[\w-]+$/.test(id) && id !== 'new' : isId(id);
  return known ? `${thing}:${id}` : null;
}
