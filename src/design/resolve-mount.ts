import type { Warning } from '../errors';
import { ringOfBlock } from '../heat';
import { findInterface, findMountMaterial } from '../materials';
import { valueOf } from './quantity-field';
import type { ChosenConstants } from './resolve-constants';
import type { MountBody, ResolvedMount, ResolvedRod } from './resolved';
import type { Design } from './schema';

const lengthOf = (text: string) => valueOf(text, 'length');

type Shape = Pick<MountBody, 'shape' | 'outerRadius' | 'beyondRing' | 'sectionArea'>;

/** The ring that a mount is computed as, in units of its conductivity; null where there is no mount. */
function shapeOfMount({ mount: { shape } }: Design, rod: ResolvedRod): Shape | null {
  if (shape.kind === 'none') return null;
  if (shape.kind === 'ring') {
    const outerRadius = lengthOf(shape.outerRadius);
    const sectionArea = Math.PI * outerRadius ** 2 - rod.sectionArea;
    return { shape: 'ring', outerRadius, beyondRing: 0, sectionArea };
  }
  const [width, depth, cover] = [shape.width, shape.depth, shape.cover].map(lengthOf) as [
    number,
    number,
    number,
  ];
  const ring = ringOfBlock({ boreRadius: rod.radius, width, depth, cover });
  return { shape: 'block', ...ring, sectionArea: width * (depth + cover) - rod.sectionArea };
}

/** What holds the barrel; nothing clamps a rod without a mount. */
function gripOf({ mount }: Design): Pick<ResolvedMount, 'grip' | 'clampingPressure'> {
  const grip = mount.shape.kind === 'none' ? 'free' : mount.grip;
  return { grip, clampingPressure: grip === 'free' ? valueOf(mount.clampingPressure, 'stress') : 0 };
}

function gripWarnings(design: Design): Warning[] {
  const { grip, clampingPressure } = gripOf(design);
  const warnings: Warning[] = [];
  const add = (where: string, text: string) => warnings.push({ where, text });
  if (design.mount.grip === 'clamped' && grip === 'free')
    add('mount.grip', 'There is no mount that could clamp the rod: the barrel is computed as free.');
  if (grip === 'clamped')
    add(
      'mount.grip',
      `The barrel is computed in a rigid, slippery bore that fitted without force at the ambient temperature "${design.surroundings.ambient}". The mount's own expansion and give are left out: the bore presses more, and leaves less tension, than a real one. A free barrel is the safer figure for fracture.`,
    );
  if (grip === 'clamped' && valueOf(design.mount.clampingPressure, 'stress') > 0)
    add(
      'mount.clampingPressure',
      'A clamped barrel takes no pressure of its own: the clamping pressure has no effect.',
    );
  if (clampingPressure > 0)
    add(
      'mount.clampingPressure',
      'An even pressure takes tension off the rod; a real clamp presses unevenly and can crack what this computes as safe.',
    );
  return warnings;
}

/** What a person should know of the mount they chose. */
function mountWarnings(design: Design): Warning[] {
  const { mount } = design;
  const contact = findInterface(mount.interface.kind)!;
  if (mount.shape.kind === 'none') {
    const text = `There is no mount: the barrel itself is cooled at the temperature of the base, through "${contact.name}". The mount material has no effect.`;
    return [{ where: 'mount.shape', text }, ...gripWarnings(design)];
  }
  const material = findMountMaterial(mount.material)!;
  const attacks = `The interface "${contact.name}" attacks ${material.name}; choose another of the two.`;
  const asRing =
    'The block is computed, and drawn, as a ring that resists as much between bore and base; its sides and top are taken as insulated, the heat as even around the bore.';
  return [
    ...(mount.shape.kind === 'block' ? [{ where: 'mount.shape', text: asRing }] : []),
    ...gripWarnings(design),
    ...(contact.incompatible?.includes(material.name)
      ? [{ where: 'mount.interface.kind', text: attacks }]
      : []),
  ];
}

/** The mount of a design in SI, with its constants chosen. */
export function resolveMount(
  design: Design,
  rod: ResolvedRod,
  values: ChosenConstants,
): { mount: ResolvedMount; warnings: Warning[] } {
  const { mount } = design;
  const material = findMountMaterial(mount.material)!;
  const shape = shapeOfMount(design, rod);
  const cautions = [
    shape ? material.caution : undefined,
    findInterface(mount.interface.kind)!.caution,
  ].filter((caution) => caution !== undefined);
  return {
    warnings: mountWarnings(design),
    mount: {
      name: shape ? material.name : 'no mount',
      body: shape && {
        ...shape,
        conductivity: values.mountConductivity!,
        density: material.values.density.nominal,
      },
      contactConductance: values.contactConductance * rod.perimeterRatio,
      baseResistance: valueOf(mount.baseResistance, 'thermalResistance'),
      ...gripOf(design),
      expansion: shape ? material.values.expansion.nominal : null,
      ...(cautions.length > 0 ? { caution: cautions.join('; ') } : {}),
    },
  };
}
