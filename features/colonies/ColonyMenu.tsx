import { useMutation } from '@tanstack/react-query';
import { Menu } from '@/components/ui/Menu';
import { useRoom } from '@/hooks/useRoom';
import { may } from '@/shared/roles';
import { type ColonyTold, useChangeColony } from './queries';

export function ColonyMenu({ told: { colony, members } }: { told: ColonyTold }) {
  const room = useRoom();
  const change = useChangeColony(colony.id);
  const end = useMutation({
    mutationFn: () => {
      const { version, code, startedOn, note } = colony;
      return change.mutateAsync({ version, code, startedOn, note, endedOn: colony.endedOn ? null : room.today });
    },
  });
  const home = `/r/${room.id}` as const;
  const at = `colony=${colony.id}${colony.tank ? `&tank=${colony.tank.id}` : ''}`;
  const items = [
    { word: 'Lineage', href: `${home}/lineage?colony=${colony.id}` as const },
    ...(may(room.role, 'entry:record')
      ? [
          { word: 'Move the colony', href: `${home}/record/move?${at}` as const },
          { word: 'Sex or mark of a fish', href: `${home}/record/finding?${at}` as const },
          { word: 'Told apart', href: `${home}/record/told-apart?${at}` as const },
        ]
      : []),
    ...(may(room.role, 'stock:write')
      ? [
          { word: 'Add fish', href: `${home}/fish/new?strain=${colony.strainId}&colony=${colony.id}` as const },
          { word: 'Change the colony', href: `${home}/colonies/${colony.id}/change` as const },
          { word: 'Print its label', href: `${home}/labels?colony=${colony.id}` as const },
          {
            word: colony.endedOn ? 'Kept again' : 'Given up today',
            note:
              end.error?.message ?? (members.length > 0 && !colony.endedOn ? 'Its fish stay in their tank' : undefined),
            onPress: () => end.mutate(),
          },
        ]
      : []),
  ];
  return <Menu label="More" items={items} />;
}
