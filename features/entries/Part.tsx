import type { ReactNode } from 'react';
import { View } from 'react-native';
import { SectionHead } from '@/components/ui/Section';

/** A part of a Record form under its own head; the form's column keeps the distances. */
export function Part({ title, aside, children }: { title: string; aside?: ReactNode; children: ReactNode }) {
  return (
    <View>
      <SectionHead title={title} aside={aside} />
      {children}
    </View>
  );
}
