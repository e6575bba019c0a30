import type { Fault } from '../errors';
import {
  findCrystal,
  findInterface,
  findMountMaterial,
  interfaces,
  mountMaterials,
  nearestName,
} from '../materials';
import { cavityFaults } from './consistency-cavity';
import { coolerFaults } from './consistency-coolers';
import { rodFaults } from './consistency-rod';
import { faultAt, unknownName } from './fault';
import { tableFaults } from './measured-profile';
import { valueOf } from './quantity-field';
import { chooseConstants } from './resolve-constants';
import type { Design } from './schema';
import { uncertainFaults } from './uncertain';

function mountFaults({ mount }: Design): Fault[] {
  const faults: Fault[] = [];
  const add = (path: string, name: string, list: typeof mountMaterials | typeof interfaces) =>
    faults.push(
      unknownName(
        path,
        name,
        list.map((item) => item.name),
        nearestName(list, name),
      ),
    );
  if (!findMountMaterial(mount.material)) add('mount.material', mount.material, mountMaterials);
  if (!findInterface(mount.interface.kind)) add('mount.interface.kind', mount.interface.kind, interfaces);
  return faults;
}

function pumpFaults(design: Design): Fault[] {
  const { pump, rod } = design;
  const { powerRange, polarisation } = pump;
  const faults = tableFaults(design);
  if (powerRange && valueOf(powerRange[0], 'power') >= valueOf(powerRange[1], 'power')) {
    const sentence = `got "${powerRange[0]}" to "${powerRange[1]}"; the first must be less than the second`;
    faults.push(faultAt('pump.powerRange', 'inconsistent', sentence));
  }
  if (polarisation !== 'unpolarised' && findCrystal(rod.crystal)?.symmetry === 'isotropic') {
    const sentence = `got "${polarisation}", which has no meaning in the isotropic ${rod.crystal}; use "unpolarised"`;
    faults.push(faultAt('pump.polarisation', 'inconsistent', sentence));
  }
  return faults;
}

/** Faults of what must fit together in a design whose single fields are all in order; empty when there are none. */
export function consistencyFaults(design: Design): Fault[] {
  const faults = [
    ...rodFaults(design),
    ...mountFaults(design),
    ...pumpFaults(design),
    ...coolerFaults(design),
    ...cavityFaults(design),
  ];
  if (faults.length > 0) return faults;
  // Which constants there are is known only of a design that holds together.
  const { missing, used } = chooseConstants(design);
  return missing.length > 0 ? missing : uncertainFaults(design, used);
}
