interface ReferenceContact { type: 'fixedT' | 'conductance'; T_K: number; h_W_m2K?: number }
interface ReferenceHolder { type: 'holder'; b_m: number; k_h_W_mK: number; h_c_W_m2K: number; outer: ReferenceContact }
export type ReferenceSide = ReferenceContact | ReferenceHolder;
export interface ReferenceEnd { type: 'insulated' | 'film'; h_W_m2K?: number; T_K?: number }
export interface ReferenceInputs {
  geometry: { a_m: number; L_doped_m: number; cap_front_m: number; cap_back_m: number };
  material: { k_r_W_mK: number; k_z_W_mK: number; k_exponent: number; dn_dT_1_K: number; n: number };
  pump: { P0_W: number; eta_h: number; alpha_1_m: number; w0_m: number; profile: string; order?: number; M2?: number | null; lambda_m?: number; z_waist_m?: number };
  boundary: { side: ReferenceSide; front: ReferenceEnd; back: ReferenceEnd };
  lens: { w_m_m: number };
  outputs: { sample_points_m: [number, number][]; I_radii_m: number[] };
}
