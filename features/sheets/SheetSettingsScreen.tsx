import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';
import { CheckRow } from '@/components/form/CheckRow';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { Code } from '@/components/ui/Code';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import { keysQuery, sheetSettingsQuery, useChangeSheetSettings, useRotateKey } from './settingsQueries';

/** What sheets tell of other people, and the keys that sign them. */
export function SheetSettingsScreen() {
  const room = useRoom();
  const settings = useQuery(sheetSettingsQuery(room.id));
  const keys = useQuery(keysQuery(room.id));
  const error = settings.error ?? keys.error;
  return (
    <Screen title="Lineage sheets" back={`/r/${room.id}/settings`} measure>
      {settings.data && keys.data ? (
        <>
          <People showPeople={settings.data.showPeople} />
          <Keys {...keys.data} />
        </>
      ) : error ? (
        <ErrorState title="The settings could not be loaded" words={error.message} />
      ) : (
        <Loading label="Loading the settings" />
      )}
    </Screen>
  );
}

function People({ showPeople }: { showPeople: boolean }) {
  const change = useChangeSheetSettings();
  return (
    <Section title="Other people">
      {change.error ? <Notice tone="look" alert words={change.error.message} /> : null}
      <CheckRow
        label="Name whom founders came from"
        on={change.isPending ? change.variables : showPeople}
        onChange={(on) => change.mutate(on)}
      />
      <Text size="small" tone="soft" style={{ marginTop: space[2] }}>
        On sheets issued from now on: the people that founders were bought from, and the fishrooms that ancestors were
        bred in. A sheet that is issued is not changed.
      </Text>
    </Section>
  );
}

type KeysProps = { keys: { id: string; createdAt: string; retiredAt: string | null }[]; keysAt: string };

function Keys({ keys, keysAt }: KeysProps) {
  const rotate = useRotateKey();
  const [asking, setAsking] = useState(false);
  return (
    <Section title="Keys" aside={keys.length > 0 ? String(keys.length) : undefined}>
      <View style={{ gap: space[3] }}>
        <Text size="small" tone="soft">
          {keys.length === 0
            ? 'The first key is made with the first sheet.'
            : `Published at ${keysAt}. Old keys stay there, so that what they signed can be checked.`}
        </Text>
        <Rows label="Keys">
          {keys.map(({ id, createdAt, retiredAt }) => (
            <Row
              key={id}
              title={<Code>{shortened(id)}</Code>}
              state={retiredAt ? 'Checks only' : 'Signs'}
              note={`Made ${formatDate(createdAt.slice(0, 10))}${retiredAt ? `, replaced ${formatDate(retiredAt.slice(0, 10))}` : ''}`}
            />
          ))}
        </Rows>
        {rotate.error ? <Notice tone="look" alert words={rotate.error.message} /> : null}
        {asking ? (
          <Notice words="A new key signs from now on. Do it when somebody could have read the old one; sheets that it signed stay valid.">
            <Button
              small
              kind="primary"
              label="Make a new key"
              busy={rotate.isPending}
              onPress={() => rotate.mutate(undefined, { onSettled: () => setAsking(false) })}
            />
            <Button small label="Not now" onPress={() => setAsking(false)} />
          </Notice>
        ) : keys.length > 0 ? (
          <ButtonRow>
            <Button small label="Change the key" onPress={() => setAsking(true)} />
          </ButtonRow>
        ) : null}
      </View>
    </Section>
  );
}

/** A thumbprint is told apart by its first letters. */
const shortened = (keyId: string): string => `${keyId.slice(0, 12)}…`;
