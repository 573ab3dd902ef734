import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';
import { Select } from '@/components/form/Select';
import { space } from '@/components/theme/space';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { LETTER_KIND_WORDS, LETTER_KINDS, type LetterKind } from '@/shared/orders/letterKinds';
import { letterQuery } from './queries';

const OPTIONS = LETTER_KINDS.map((value) => ({ value, word: LETTER_KIND_WORDS[value] }));

/** A letter as it would go out now. Nothing is sent by reading it. */
export function LetterSheet({ orderId, onClose }: { orderId: string; onClose: () => void }) {
  const room = useRoom();
  const [kind, setKind] = useState<LetterKind>('reserved');
  const { data, error } = useQuery(letterQuery(room.id, orderId, kind));
  return (
    <Sheet open title="Letters to the buyer" onClose={onClose} width={560}>
      <View style={{ gap: space[3] }}>
        <Select
          label="Letter"
          options={OPTIONS}
          value={kind}
          onChange={(value) => setKind(LETTER_KINDS.find((one) => one === value) ?? kind)}
        />
        {data ? (
          <>
            <Text size="small" tone="soft">
              {data.to ? `To ${data.to}` : 'This buyer has no address: it would not go out.'}
            </Text>
            <Text strong size="title">
              {data.subject}
            </Text>
            <Text>{data.text}</Text>
          </>
        ) : error ? (
          <ErrorState title="The letter could not be read" words={error.message} />
        ) : (
          <Loading label="Writing the letter" rows={4} />
        )}
      </View>
    </Sheet>
  );
}
