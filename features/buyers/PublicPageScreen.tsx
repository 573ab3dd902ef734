import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { type listOffers, setPublicPage } from '@/shared/buyers/offers';
import { Id } from '@/shared/ids';
import { TypedNote } from '@/shared/shapes';
import { PhotoChoice } from './PhotoChoice';
import { offersQuery, useAct } from './queries';

const Draft = z.strictObject({ words: TypedNote, contact: TypedNote, photoId: z.nullable(Id) });

/** What the public page says besides the fish, and the way to it. */
export function PublicPageScreen() {
  const room = useRoom();
  const { data, error, refetch } = useQuery(offersQuery(room.id));
  return (
    <Screen title="Public page" back={`/r/${room.id}/buyers/availability`} measure>
      {data ? (
        <PageForm told={data} />
      ) : error ? (
        <ErrorState title="The page could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the page" rows={4} />
      )}
    </Screen>
  );
}

function PageForm({ told }: { told: z.output<typeof listOffers.output> }) {
  const { id: roomId } = useRoom();
  const act = useAct();
  const { page, slug, offers } = told;
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { words: page.words ?? '', contact: page.contact ?? '', photoId: page.photoId },
    save: (body) => act.mutateAsync(() => call(setPublicPage, { params: { roomId }, body })),
  });
  const open = offers.some(({ listing }) => listing?.listed);
  return (
    <View style={{ gap: space[5] }}>
      {open ? (
        <Button label="See the page as anyone does" href={`/available/${slug}`} />
      ) : (
        <Notice words="Nobody can see the page yet: it opens with the first brood that is listed." />
      )}
      <Form form={form} notice={notice} label="Public page">
        <TextField
          name="words"
          label="Under the fishroom’s name"
          aside="not needed"
          hint="What is bred here, how fish are handed over."
          long
        />
        <TextField
          name="contact"
          label="How to reach you"
          aside="not needed"
          hint="For visitors who don’t use the form. Anyone can read it."
          long
        />
        <PhotoChoice name="photoId" />
        <SubmitButton label="Save page" />
      </Form>
    </View>
  );
}
