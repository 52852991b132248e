import { View } from 'react-native';
import { failureWords } from '@/features/api/failure-words';
import { useOrbit } from '@/features/api/orbits';
import { useSystems } from '@/features/api/systems';
import { Bench } from '@/features/bench/bench';
import { keptDraft } from '@/features/bench/kept-drafts';
import { draftOfBody, draftOfSystem, emptyDraft, type OrbitDraft } from '@/features/checking/orbit-draft';
import { Failure, Page, PageSkeleton, Text } from '@/features/ui';
import type { Entry, System } from '@/schemas/generated/contract';

const TITLE = 'Bench';

export interface BenchScreenProps {
  /** Slug of the system to begin with. */
  system: string | null;
  /** Accession of the entry whose numbers fill the form. */
  from: string | null;
}

/** Try an orbit before it is sent. */
export function BenchScreen({ system, from }: BenchScreenProps) {
  const systems = useSystems();
  const entry = useOrbit(from ?? '', from !== null);
  if (systems.isPending || (from !== null && entry.isPending)) return <PageSkeleton title={TITLE} />;
  return (
    <Page
      title={TITLE}
      subtitle={<Text tone="muted">Nothing here is sent until you send it. Kept on this device as you type.</Text>}
    >
      {systems.isError ? (
        <Failure
          {...failureWords(systems.error, 'The list of systems', 'What you typed is kept on this device.')}
          onRetry={systems.refetch}
        />
      ) : (
        <View>
          <Bench systems={systems.data} start={firstDraft(systems.data, system, entry.data ?? null)} />
        </View>
      )}
    </Page>
  );
}

/** The form begins with the entry asked for, else with what was kept, else empty. */
function firstDraft(systems: readonly System[], slug: string | null, entry: Entry | null): OrbitDraft {
  if (entry) return draftOfBody({ ...entry.submitted });
  const chosen = systems.find((one) => one.slug === slug);
  return keptDraft(slug) ?? (chosen ? draftOfSystem(chosen) : emptyDraft);
}
