import { type RefObject, useState } from 'react';
import type { View } from 'react-native';
import { IconButton } from '@/components/ui/IconButton';
import type { Due } from '@/shared/today/due';
import { dueTitle } from '@/shared/today/dueWords';
import { TaskSheet } from './TaskSheet';

/** Done, put off, skipped or given to someone: one tap away from every task. */
export function TaskButton({ due, anchor }: { due: Due; anchor: RefObject<View | null> }) {
  const [open, setOpen] = useState(false);
  const what = [dueTitle(due), due.code].filter(Boolean).join(', ');
  return (
    <>
      <IconButton icon="box" label={`Settle ${what}`} popup="dialog" expanded={open} onPress={() => setOpen(true)} />
      {open ? <TaskSheet due={due} what={what} anchor={anchor} onClose={() => setOpen(false)} /> : null}
    </>
  );
}
