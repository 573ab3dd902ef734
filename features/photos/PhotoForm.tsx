import { launchCameraAsync, launchImageLibraryAsync } from 'expo-image-picker';
import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { InputBox } from '@/components/form/InputBox';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { PhotoTile } from '@/components/ui/PhotoTile';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { newId, useRecord } from '@/features/entries';
import { useLeave } from '@/features/entries/useLeave';
import type { PhotosOf } from './queries';

type Chosen = { key: string; entryId: string; file: File; uri: string; trouble: string | null };

/** Several photos at once, each a record of its own: what was refused is sent again with one tap. */
export function PhotoForm({ of, subtitle }: { of: PhotosOf; subtitle: string }) {
  const record = useRecord();
  const leave = useLeave();
  const [photos, setPhotos] = useState<Chosen[]>([]);
  const [caption, setCaption] = useState('');
  const [busy, setBusy] = useState(false);
  const change = (key: string, part: Partial<Chosen>) =>
    setPhotos((all) => all.map((one) => (one.key === key ? { ...one, ...part } : one)));
  const choose = async (from: 'camera' | 'library') => {
    const options = {
      mediaTypes: ['images' as const],
      quality: 1,
      allowsMultipleSelection: from === 'library',
      exif: false,
    };
    const picked = await (from === 'camera' ? launchCameraAsync(options) : launchImageLibraryAsync(options));
    const added = (picked.assets ?? []).flatMap(({ file, uri }) =>
      file ? [{ key: newId(), entryId: newId(), file, uri, trouble: null }] : [],
    );
    setPhotos((all) => [...all, ...added]);
  };
  const send = async () => {
    setBusy(true);
    let failed = false;
    for (const { key, entryId, file } of photos) {
      const content = {
        kind: 'photoTaken' as const,
        photoId: key,
        of: { thing: of.thing, id: of.thingId },
        takenOn: null,
        caption: caption.trim() || null,
      };
      change(key, { trouble: null });
      try {
        await record(content, { id: entryId, picture: file });
        setPhotos((all) => all.filter((one) => one.key !== key));
      } catch (error) {
        failed = true;
        change(key, { trouble: error instanceof Error ? error.message : 'Not sent' });
      }
    }
    setBusy(false);
    if (!failed) leave();
  };
  const word = photos.length === 1 ? 'Save photo' : `Save ${photos.length} photos`;
  return (
    <Screen
      title="Photo"
      subtitle={subtitle}
      close={{ label: 'Close Photo', onPress: () => leave() }}
      dock={
        <Button
          kind="primary"
          grow
          label={photos.length > 0 ? word : 'Save photo'}
          busy={busy}
          busyLabel="Sending"
          onPress={() => void send()}
          {...(photos.length === 0 ? { disabledBecause: 'Choose a photo first' } : {})}
        />
      }
      low
      measure
    >
      <View style={{ gap: space[4] }}>
        <View style={styles.line}>
          <Button icon="photo" label="Take a photo" onPress={() => void choose('camera')} />
          <Button icon="plus" label="Choose photos" onPress={() => void choose('library')} />
        </View>
        {photos.map(({ key, uri, trouble, file }) => (
          <View key={key} style={{ gap: space[2] }}>
            <PhotoTile uri={uri} alt={file.name} aspect={1.5} waiting />
            {trouble ? <Notice tone="act" alert words={trouble} /> : null}
            {busy ? null : (
              <Button
                small
                kind="text"
                label={`Leave out ${file.name}`}
                onPress={() => setPhotos((all) => all.filter((one) => one.key !== key))}
              />
            )}
          </View>
        ))}
        <InputBox value={caption} onChangeText={setCaption} placeholder="Caption, not needed" aria-label="Caption" />
        <Text size="small" tone="soft">
          The date is read from the picture. Where it was taken is removed before it is stored.
        </Text>
      </View>
    </Screen>
  );
}

const styles = StyleSheet.create({ line: { flexDirection: 'row', flexWrap: 'wrap', gap: space[2] } });
