import type { SystemDocument } from '@/schemas/generated/contract';
import brusselator from '@/server/systems/brusselator.json';
import cr3bpPlanar from '@/server/systems/cr3bp-planar.json';
import cr3bpSpatial from '@/server/systems/cr3bp-spatial.json';
import duffing from '@/server/systems/duffing.json';
import fitzhughNagumo from '@/server/systems/fitzhugh-nagumo.json';
import henonHeiles from '@/server/systems/henon-heiles.json';
import hopf from '@/server/systems/hopf.json';
import kepler from '@/server/systems/kepler.json';
import lorenz from '@/server/systems/lorenz.json';
import lotkaVolterra from '@/server/systems/lotka-volterra.json';
import pendulum from '@/server/systems/pendulum.json';
import rossler from '@/server/systems/rossler.json';
import threeBodyPlanar from '@/server/systems/three-body-planar.json';
import vanDerPol from '@/server/systems/van-der-pol.json';

/** A system that comes with the archive: every member of its document is there, save the table of counts. */
export type BuiltInSystem = Required<Omit<SystemDocument, 'counts'>> & Pick<SystemDocument, 'counts'>;

/** The systems that come with the archive, in the order in which they are listed. */
export const builtInSystems: readonly BuiltInSystem[] = [
  lorenz,
  rossler,
  henonHeiles,
  vanDerPol,
  cr3bpPlanar,
  cr3bpSpatial,
  threeBodyPlanar,
  duffing,
  lotkaVolterra,
  brusselator,
  fitzhughNagumo,
  pendulum,
  hopf,
  kepler,
] as BuiltInSystem[];
