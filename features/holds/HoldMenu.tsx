import { Menu, type MenuItem } from '@/components/ui/Menu';
import { useRoom } from '@/hooks/useRoom';
import type { HoldRow } from '@/shared/holds/contract';
import { may } from '@/shared/roles';
import { modeWords } from './modeWords';

/** The rarer things: it was lost, a photo, a correction; and the pages around it. */
export function HoldMenu({ hold }: { hold: HoldRow }) {
  const room = useRoom();
  const home = `/r/${room.id}` as const;
  const isOpen = hold.endedOn === null;
  const { ends, carer } = modeWords(hold.mode);
  const items: MenuItem[] = [];
  if (may(room.role, 'entry:record')) {
    if (isOpen)
      items.push({
        word: `${ends.swallowed} or lost`,
        icon: 'swallowed',
        href: `${home}/record/swallowed?hold=${hold.id}`,
      });
    items.push({ word: 'Photo', icon: 'photo', href: `${home}/record/photo?hold=${hold.id}` });
  }
  if (isOpen && may(room.role, 'entry:correct'))
    items.push({
      word: 'Correct',
      icon: 'edit',
      note: hold.holder ? `Its days, or the ${carer}` : `Its days, or which ${carer} it is`,
      href: `${home}/record/hold-correction?hold=${hold.id}`,
    });
  if (may(room.role, 'parentage:write'))
    items.push({ word: 'Set parents', icon: 'lineage', href: `${home}/lineage/parents/${hold.id}` });
  if (hold.holder) items.push({ word: `The ${carer}`, icon: 'next', href: `${home}/fish/${hold.holder.id}` });
  if (hold.colony)
    items.push({ word: `Colony ${hold.colony.code}`, icon: 'next', href: `${home}/colonies/${hold.colony.id}` });
  items.push({ word: `Tank ${hold.tank.code}`, icon: 'next', href: `${home}/tanks/${hold.tank.id}` });
  return <Menu label="More" items={items} />;
}
