/**
 * Reads the sourced values: cases worked out independently of this program, with the way they were found in each
 * file's `about`, `source` and `verify`. Types name what the tests use.
 *
 * Units    g/L, mg/L of enzyme, g/(mg min), min, degC, kJ/mol, L, unless a key says otherwise.
 */
import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'

/** One case; `verify` is the largest relative difference between the two routes that found it. */
export interface Case<I, E> {
  readonly id: string
  readonly inputs: I
  readonly expected: E
  readonly verify: Readonly<Record<string, number>>
  readonly note?: string
}

export interface ReferenceFile<C> {
  readonly about: string
  readonly source: string
  readonly cases: readonly C[]
}

/** Null: that term is absent. */
export interface LawInputs {
  readonly S0: number
  readonly P0?: number
  readonly y?: number
  readonly Km: number
  readonly Kic?: number | null
  readonly Kiu?: number | null
  readonly Ksi?: number | null
  /** With Keq: the product constant of the reversible law. */
  readonly Kp?: number
  readonly Keq?: number
}

interface State {
  readonly t: number
  readonly S: number
  readonly P: number
  readonly X: number
}

interface TimeTo {
  readonly X: number
  readonly reachable: boolean
  readonly t?: number
  readonly limiting_conversion?: number
}

export type ClosedFormCase = Case<
  LawInputs & {
    readonly kcat?: number
    readonly E?: number
    readonly E_U_per_mL?: number
    readonly molar_mass_substrate_g_per_mol?: number
  },
  {
    readonly Vmax: number
    readonly state_at_time?: readonly {
      readonly t: number
      readonly S: number
      readonly S0_minus_S: number
      readonly X: number
      readonly condition_number_S_wrt_t: number
    }[]
    readonly time_to_conversion: readonly { readonly X: number; readonly t: number }[]
  }
>

export type InhibitionCase = Case<
  LawInputs & { readonly kcat: number; readonly E: number },
  {
    readonly initial_rate: number
    readonly time_to_conversion: readonly TimeTo[]
    readonly state_at_time: readonly State[]
    readonly equilibrium_S?: number
    readonly equilibrium_X?: number
  }
>

export interface EdgePoint {
  readonly X: number
  readonly E0: number
  readonly t: number
  readonly condition_number_t_wrt_E0: number
  readonly just_below: { readonly E0: number; readonly limiting_conversion: number }
}

export type InactivationCase = Case<
  LawInputs & { readonly kcat: number; readonly kd: number; readonly E0: number },
  {
    readonly time_to_conversion: readonly (TimeTo & {
      readonly E_remaining_fraction?: number
      readonly minimum_dose_E0: number | null
    })[]
    readonly limiting_conversion: number | null
    readonly one_minus_limiting_conversion: number | null
    readonly dose_for_time: readonly {
      readonly X: number
      readonly t: number
      readonly reachable: boolean
      readonly E0?: number
    }[]
    readonly edge_of_reachability: readonly EdgePoint[]
    readonly state_at_time: readonly (State & { readonly E: number })[]
  }
>

export interface ActivityRow {
  readonly t: number
  readonly E: number
  readonly E1: number
  readonly Ed: number
  readonly activity: number
  readonly activity_integral: number
}

export interface SeriesInputs {
  readonly k1: number
  readonly k2: number
  readonly alpha1: number
  readonly alpha2: number
}

/** A course of activity, or (with a charge) a batch. */
export type TwoStepCase = Case<
  SeriesInputs & Partial<LawInputs> & { readonly kcat?: number; readonly E0?: number },
  {
    readonly activity_vs_time?: readonly ActivityRow[]
    readonly time_to_half_activity?: number
    readonly time_of_maximum_activity?: number
    readonly maximum_activity?: number
    readonly time_to_conversion?: readonly TimeTo[]
    readonly limiting_conversion?: number
  }
>

/** min and degC, linear in between. */
export type Breakpoint = readonly [number, number]

export interface ArrheniusInputs {
  readonly kcat_ref: number
  readonly Ea: number
  readonly T_ref: number
  readonly kd_ref: number
  readonly Ed: number
  readonly Td_ref: number
}

export type ProgrammeCase = Case<
  LawInputs &
    ArrheniusInputs & {
      readonly pH_factor: number
      readonly E0: number
      readonly temperature_program: readonly Breakpoint[]
    },
  {
    readonly state_at_time: readonly (State & {
      readonly T: number
      readonly E: number
      readonly ln_E_over_dose: number
      readonly kcat_E_integral: number
    })[]
    readonly time_to_conversion: readonly {
      readonly X: number
      readonly reachable_within_program: boolean
      readonly t?: number
    }[]
  }
>

export interface StagedInputs extends LawInputs {
  readonly kind: 'staged_dose' | 'staged_dose_temperature_program' | 'fed_batch'
  readonly kcat?: number
  readonly kd?: number
  readonly kcat_ref?: number
  readonly Ea?: number
  readonly T_ref?: number
  readonly kd_ref?: number
  readonly Ed?: number
  readonly Td_ref?: number
  readonly temperature_program?: readonly Breakpoint[]
  readonly V0?: number
  readonly E0?: number
  readonly feed?: {
    readonly t_on: number
    readonly t_off: number
    readonly F0: number
    readonly F1: number
    readonly Sf: number
    readonly Ef: number
  }
  readonly doses: readonly { readonly t: number; readonly E_added: number }[]
}

export type StagedCase = Case<
  StagedInputs,
  {
    readonly state_at_time: readonly {
      readonly t: number
      readonly T?: number
      readonly S: number
      readonly P: number
      readonly X?: number
      readonly E: number
      readonly V: number
      readonly X_of_supplied?: number
    }[]
  }
>

export type OptimumCase = Case<
  LawInputs &
    ArrheniusInputs & {
      readonly problem: string
      readonly E0: number
      readonly X: number
      readonly t: number
      readonly T_min: number
      readonly T_max: number
    },
  {
    readonly T_opt: number
    readonly at_bound: boolean
    readonly t_min: number
    readonly X_max: number
    readonly T_max_reachable: number | null
    readonly E_remaining_fraction: number
    readonly kd_t_at_optimum: number
    readonly time_at_other_temperatures: readonly { readonly T: number; readonly t: number }[]
    readonly conversion_at_other_temperatures: readonly { readonly T: number; readonly X: number }[]
  }
>

export type BellCase = Case<
  { readonly model: 'bell'; readonly pKa1: number; readonly pKa2: number },
  {
    readonly optimum_pH: number
    readonly raw_at_optimum: number
    readonly half_activity_pH: readonly [number, number]
    readonly profile: readonly { readonly pH: number; readonly raw: number; readonly normalised: number }[]
  }
>

export type FullPhCase = Case<
  {
    readonly model: 'full'
    readonly kcat: number
    readonly E: number
    readonly Km: number
    readonly S: number
    readonly pKe1: number
    readonly pKe2: number
    readonly pKes1: number
    readonly pKes2: number
  },
  {
    readonly optimum_pH_of_v: number
    readonly v_at_optimum: number
    readonly optimum_pH_of_Vmax: number
    readonly optimum_pH_of_Vmax_over_Km: number
    readonly profile: readonly {
      readonly pH: number
      readonly Vmax_app: number
      readonly Km_app: number
      readonly Vmax_over_Km_app: number
      readonly v: number
    }[]
  }
>

/** Which keys are there depends on the relation or model named. */
type Numbers<K extends string> = { readonly [key in K]: number }

export type RelationCase = Case<
  { readonly relation: string } & Numbers<
    | 'Q10'
    | 'T'
    | 'Ea'
    | 'k1'
    | 'T1'
    | 'k2'
    | 'T2'
    | 'kd'
    | 'z'
    | 'T_low'
    | 'T_high'
    | 'D_at_T_low'
    | 'Ed'
    | 'U'
  > &
    Numbers<'U_per_mL' | 'molar_mass_g_per_mol' | 'activity_U_per_g' | 'T_assay' | 'T_process'>,
  Readonly<Record<string, number>>
>

export type ProteinCase = Case<
  { readonly model: string } & Numbers<
    'a' | 'b' | 'kd' | 'DH0' | 'B_mL' | 'Nb_meq_per_mL' | 'pH' | 'pK' | 'MP_g_protein' | 'htot_meq_per_g'
  > &
    Numbers<'T' | 'pK_25' | 'slope_K'>,
  {
    readonly DH_vs_time: readonly { readonly t: number; readonly DH: number; readonly rate?: number }[]
    readonly time_to_DH: readonly { readonly DH: number; readonly t: number }[]
  } & Numbers<
    'limiting_DH' | 'alpha' | 'inverse_alpha' | 'DH_percent' | 'base_needed_mL_for_DH_10_percent' | 'pK'
  >
>

export type WorkedCase = Case<
  Numbers<'Km_mol_per_L' | 'Vmax_at_5_g_per_L' | 'enzyme_g_per_L' | 'S0_mol_per_L' | 'X' | 'half_life_h'> &
    Numbers<'Km_mM' | 'Vmax_mM_per_h' | 'Vmax0_mM_per_h' | 'S0_mM'>,
  {
    readonly time_to_conversion: readonly { readonly X: number; readonly t_h: number }[]
  } & Numbers<'t_s' | 'Vmax_mol_per_L_s' | 'log_term_s' | 'linear_term_s' | 'kd_per_h'> &
    Numbers<'t_h_without_decay' | 't_h' | 't_h_with_kd_rounded_0.158'> &
    Numbers<'kd_soluble_per_min' | 'half_life_soluble_min' | 'kd_immobilised_per_min'> &
    Numbers<'half_life_immobilised_min'>
>

interface Files {
  readonly michaelis_menten_closed_form: ClosedFormCase
  readonly product_inhibition: InhibitionCase
  readonly inactivation: InactivationCase
  readonly two_step_inactivation: TwoStepCase
  readonly temperature_program: ProgrammeCase
  readonly staged_dose: StagedCase
  readonly optimum: OptimumCase
  readonly ph_profile: BellCase | FullPhCase
  readonly temperature_relations: RelationCase
  readonly protein_dh: ProteinCase
  readonly worked_examples: WorkedCase
}

/** The values of one file. */
export const load = <N extends keyof Files>(name: N): ReferenceFile<Files[N]> =>
  JSON.parse(
    readFileSync(fileURLToPath(new URL(`./${name}.json`, import.meta.url)), 'utf8'),
  ) as ReferenceFile<Files[N]>
