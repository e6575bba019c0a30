/** What happens at one end face of the rod. */
export type EndModel =
  | { kind: 'insulated' }
  /** Convection and radiation to the air: outward flux = coefficient (T - T_air), W/(m^2 K). */
  | { kind: 'film'; coefficient: number };

/** How the barrel of a body is cooled. */
export type ContactModel =
  /** The surface has the base temperature. */
  | { kind: 'fixed' }
  /** Outward flux = conductance (T - T_base), W/(m^2 K). */
  | { kind: 'contact'; conductance: number };

/** How the barrel of the rod is cooled: directly, or through a ring whose outer surface is cooled. */
export type SideModel =
  | ContactModel
  | {
      kind: 'ring';
      /** Interface between rod and ring, W/(m^2 K). */
      contactConductance: number;
      /** Thermal conductivity of the ring, W/(m K). */
      conductivity: number;
      /** m. */
      outerRadius: number;
      outer: ContactModel;
    };

/** A cylindrical rod, its end caps and its cooling. Lengths in m, conductivities in W/(m K). The pump enters at z = 0. */
export interface RodHeatModel {
  radius: number;
  /** Undoped length at the pumped end. */
  frontCap: number;
  dopedLength: number;
  /** Undoped length at the far end. */
  backCap: number;
  /** Across the axis, at 300 K when the conductivity depends on temperature. */
  conductivityRadial: number;
  conductivityAxial: number;
  /** m of k = k_300 (300 K / T)^m; left out or 0: constant. */
  conductivityExponent?: number;
  side: SideModel;
  front: EndModel;
  back: EndModel;
}

/** Temperatures outside the rod, K: mount base (or barrel), air at the pumped end, air at the far end. */
export interface BoundaryTemperatures {
  side: number;
  front: number;
  back: number;
}
