import { createContext, type RefObject, use } from 'react';
import type { ScrollView } from 'react-native';

/** Where a screen stands: alone, or as the list, the detail or the aside of a wide page. */
export type PanePlace = 'alone' | 'list' | 'detail' | 'aside';

export const PaneContext = createContext<PanePlace>('alone');
export const usePane = (): PanePlace => use(PaneContext);

/** What scrolls around, for lists of thousands that draw only what is seen. */
export const ScrollContext = createContext<RefObject<ScrollView | null> | null>(null);
