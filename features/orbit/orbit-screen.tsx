import { isRefusal } from '@/features/api/api-error';
import { failureWords } from '@/features/api/failure-words';
import { useOrbit } from '@/features/api/orbits';
import { useSystem } from '@/features/api/systems';
import { NoSuchEntry } from '@/features/notation/no-such-entry';
import { OrbitPage } from '@/features/orbit/orbit-page';
import type { Trail } from '@/features/orbit/trail';
import { Failure, Page, PageSkeleton } from '@/features/ui';

export interface OrbitScreenProps {
  accession: string;
  /** The search that led here; null when none did. */
  trail: Trail | null;
}

/** The page of one entry. */
export function OrbitScreen({ accession, trail }: OrbitScreenProps) {
  const orbit = useOrbit(accession);
  const slug = orbit.data?.system.slug;
  const system = useSystem(slug ?? '', slug !== undefined);
  const back = { href: trail?.href ?? '/', label: trail?.label ?? 'Catalogue' };

  if (orbit.isPending) return <PageSkeleton title={accession} back={back} />;
  if (isRefusal(orbit.error, 'unknown-accession', 'wrong-check-character')) {
    return (
      <Page title="Nothing here" back={back}>
        <NoSuchEntry accession={accession} error={orbit.error} />
      </Page>
    );
  }
  if (orbit.isError) {
    return (
      <Page title={accession} back={back}>
        <Failure {...failureWords(orbit.error, 'The entry', 'Nothing was lost.')} onRetry={orbit.refetch} />
      </Page>
    );
  }
  if (system.isLoading) return <PageSkeleton title={accession} back={back} />;
  return <OrbitPage entry={orbit.data} system={system.data} trail={trail} />;
}
