import { type ComponentType, lazy } from 'react';
import { Text } from '@/features/ui';
import type * as Pictures from './pictures';

/** The numbers are there without the picture, so a page goes on when its code does not come. */
const NoPicture = () => <Text role="status">The picture did not load. Its table has all the numbers.</Text>;

/** A picture whose code is fetched when it is first drawn. */
function lazyPicture<Props>(choose: (pictures: typeof Pictures) => ComponentType<Props>) {
  return lazy<ComponentType<Props>>(() =>
    import('./pictures').then(
      (pictures) => ({ default: choose(pictures) }),
      () => ({ default: NoPicture }),
    ),
  );
}

export const OrbitPlot = lazyPicture((pictures) => pictures.OrbitPlot);
export const SectionPlot = lazyPicture((pictures) => pictures.SectionPlot);
export const SectionSheet = lazyPicture((pictures) => pictures.SectionSheet);
export const TimePlot = lazyPicture((pictures) => pictures.TimePlot);
export const UnitCircle = lazyPicture((pictures) => pictures.UnitCircle);
