/** One limit at one operating point. `margin` > 0 holds, in `unit`; `share` is the margin over the room there is. */
export interface Margin {
  limit: LimitName;
  /** Whether the lasing or the blocked-beam state is the worse one for this limit. */
  beam: 'lasing' | 'blocked';
  value: number;
  bound: number;
  unit: string;
  margin: number;
  share: number;
  holds: boolean;
}

export type LimitName =
  | 'rod peak temperature'
  | 'fracture stress'
  | 'cavity stability'
  | 'diode case window'
  | 'diode case temperature'
  | 'dew point'
  | 'cooler capacity'
  | 'TEC current'
  | 'aberration loss'
  | 'steady state';
