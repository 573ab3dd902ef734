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
import { REQUEST_LETTER_WORDS, REQUEST_LETTERS, type RequestLetter } from '@/shared/buyers/requestLetters';
import type { RequestRow } from '@/shared/buyers/requests';
import { requestLetterQuery } from './queries';

const OPTIONS = REQUEST_LETTERS.map((value) => ({ value, word: REQUEST_LETTER_WORDS[value] }));

/** A letter as it would go out now. Nothing is sent by reading it. */
export function RequestLetterSheet({ request, onClose }: { request: RequestRow; onClose: () => void }) {
  const room = useRoom();
  const [kind, setKind] = useState<RequestLetter>(request.kind === 'fish' ? 'fishFree' : 'sizeReached');
  const { data, error } = useQuery(requestLetterQuery(room.id, request.id, kind));
  return (
    <Sheet open title="Letters to the visitor" onClose={onClose} width={560}>
      <View style={{ gap: space[3] }}>
        <Select
          label="Letter"
          options={OPTIONS}
          value={kind}
          onChange={(value) => setKind(REQUEST_LETTERS.find((one) => one === value) ?? kind)}
        />
        {data ? (
          <>
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
