import { useRouter } from 'expo-router';
import { lazy, Suspense } from 'react';
import { useIsWide } from '@/components/theme/breakpoint';
import { Loading } from '@/components/ui/Loading';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { LineageFrame } from './LineageFrame';
import { inScope, withAncestors } from './scope';

const LineageGraph = lazy(() => import('./LineageGraph').then((module) => ({ default: module.LineageGraph })));

/** All living fish and broods of a strain with three generations behind them. */
export function LineageGraphScreen() {
  const room = useRoom();
  const router = useRouter();
  const wide = useIsWide();
  return (
    <LineageFrame tab="graph">
      {(nodes, scope) => {
        const living = inScope(nodes, scope).filter((node) => node.living);
        return (
          <>
            <Text tone="soft">
              {`${living.length} living fish and broods, with their ancestors over three generations. Press one for its own page.`}
            </Text>
            <Suspense fallback={<Loading label="Drawing the lineage" rows={4} />}>
              <LineageGraph
                key={scope.value}
                label={`Lineage of ${scope.said}`}
                shown={withAncestors(nodes, living)}
                all={nodes}
                selected={null}
                onSelect={(id) => router.push(`/r/${room.id}/lineage/${id}`)}
                windowHeight={wide ? 560 : 460}
              />
            </Suspense>
          </>
        );
      }}
    </LineageFrame>
  );
}
