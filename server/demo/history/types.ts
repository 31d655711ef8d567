import type { CatalogueSlug } from '#server/features/faults/catalogue.ts';
import type { SeverityGrade } from '#server/features/faults/catalogue/fault-definition.ts';
import type { BatchState, CookStage, Cover, DispositionKind, Gel, Palette, Trace } from '#shared/words/batch-words.ts';
import type { Answer } from '#shared/words/fault-words.ts';
import type { LotStanding, MaterialKind } from '#shared/words/lot-words.ts';
import type { Method } from '#shared/words/methods.ts';
import type { Role } from '#shared/words/roles.ts';
import type { Stage } from '#shared/words/stages.ts';

/** An invented workshop as plain values; people, lots and batches are named by their keys and codes. */
export interface WorkshopHistory {
  name: string;
  timeZone: string;
  currency: string;
  batchPrefix: string;
  nextBatchNumber: number;
  firstPriceMinor: number;
  secondPriceMinor: number;
  /** First day of week 1. */
  startsOn: string;
  people: HistoryPerson[];
  suppliers: HistorySupplier[];
  materials: HistoryMaterial[];
  lots: HistoryLot[];
  formulas: HistoryFormula[];
  moulds: HistoryMould[];
  batches: HistoryBatch[];
}

export interface HistoryPerson { key: string; name: string; email: string; role: Role }
export interface HistorySupplier { key: string; name: string; contactName: string; email: string; phone?: string; note?: string }

export interface HistoryMaterial {
  key: string;
  kind: MaterialKind;
  name: string;
  inciName?: string;
  saponificationKohMgPerG?: number;
  isHardFat?: boolean;
  isLauric?: boolean;
  isAnimal?: boolean;
  isLinoleicRich?: boolean;
  isEssentialOil?: boolean;
  isWhitePigment?: boolean;
  alkali?: 'naoh' | 'koh';
  note?: string;
}

export interface StandingChange { on: string; by: string; before: LotStanding; after: LotStanding; reason: string }

export interface HistoryLot {
  code: string;
  material: string;
  supplier: string;
  productName?: string;
  productNumber?: string;
  orderedOn: string;
  receivedOn: string;
  openedOn?: string;
  finishedOn?: string;
  bestBeforeOn?: string;
  quantityG: number;
  quantityLeftG: number;
  priceMinorPerKg: number;
  purityFraction?: number;
  certificateMaxFraction?: number;
  certificateEdition?: string;
  certificateOn?: string;
  flashPointC?: number;
  vanillinFraction?: number;
  intendedUseNote?: string;
  storage?: string;
  note?: string;
  standing: LotStanding;
  standingChanges: StandingChange[];
}

export interface HistoryMould { key: string; name: string; oilMassG: number; bars: number }

export interface FormulaLine { material: string; shareOfOils: number }
export interface HistoryFormulaVersion { number: number; superfatFraction: number; lines: FormulaLine[]; note?: string }
export interface HistoryFormula { key: string; name: string; note?: string; cureWeeks?: number; versions: HistoryFormulaVersion[] }

export interface Ingredient { material: string; lot: string | null; massG: number; shareOfOils: number }

/** Everything known about a batch before a fault could show. */
export interface BatchInputs {
  method: Method;
  maker: string;
  formula: string;
  formulaVersion: number;
  mould: string;
  oilMassG: number;
  bars: number;
  waterToLye: number;
  superfatFraction: number;
  superfatWeighedFraction: number;
  oilTemperatureC: number;
  lyeTemperatureC: number;
  batterTemperatureC: number;
  scentTemperatureC: number | null;
  roomTemperatureC: number;
  humidityFraction: number;
  blendSeconds: number;
  traceAtScent: Trace | null;
  traceAtPour: Trace | null;
  minutesToPour: number | null;
  cover: Cover;
  isSprayed: boolean;
  gel: Gel;
  cookTemperatureC: number | null;
  cookMinutes: number | null;
  cookLossFraction: number | null;
  cookStages: { stage: CookStage; minutesFromStart: number }[];
  mouldHours: number;
  cutHours: number;
  fragranceFraction: number | null;
  fragranceLot: string | null;
  hasWhitePigment: boolean;
  hasEmbeds: boolean;
  ingredients: Ingredient[];
  palette: Palette;
}

/** A fault a batch really has, whether or not anybody looks. */
export interface TrueFault {
  fault: CatalogueSlug;
  severity: SeverityGrade;
  /** Earliest stage of this batch at which it shows. */
  from: Stage;
  /** Last stage at which it still shows; absent when it stays. */
  until?: Stage;
  /** Starts one grade milder. */
  grows: boolean;
  /** Bars that carry it, numbered from the maker's mark. */
  bars: number[];
}

export interface HistoryFinding {
  fault: CatalogueSlug;
  severity: SeverityGrade;
  /** Null while there are no bars yet. */
  bars: number[] | null;
  note?: string;
}

export interface HistoryReading { kind: 'bar-mass-g' | 'room-temperature-c' | 'humidity-fraction' | 'ph'; value: number; bar?: number }

export interface HistoryInspection {
  stage: Stage;
  /** Instant, ISO 8601 with Z. */
  at: string;
  inspector: string;
  barsLookedAt: number | null;
  answers: { fault: CatalogueSlug; answer: Answer }[];
  findings: HistoryFinding[];
  readings: HistoryReading[];
  note?: string;
}

/** What the picture of a batch at a stage must show. */
export interface HistoryPhoto {
  stage: Stage;
  takenAt: string;
  offsetMinutes: number;
  camera: string;
  uploadedBy: string;
  hasGreyCard: boolean;
  /** Faults that show in it, as grave as they are by then. */
  shows: { fault: CatalogueSlug; severity: SeverityGrade; bars: number[] }[];
  /** Findings of this stage's inspection that are marked on it. */
  marks: CatalogueSlug[];
}

export interface HistoryDisposition { kind: DispositionKind; bars: number; fault: CatalogueSlug | null; note?: string }

export interface HistoryBatch {
  code: string;
  /** Week of the story, 1 to 104; null for what is planned. */
  week: number;
  madeOn: string;
  pouredAt: string | null;
  unmouldedOn: string | null;
  cutOn: string | null;
  state: BatchState;
  holdReason?: string;
  note: string | null;
  inputs: BatchInputs;
  truth: TrueFault[];
  inspections: HistoryInspection[];
  photos: HistoryPhoto[];
  dispositions: HistoryDisposition[];
  /** Codes of batches whose bars are in this one. */
  holdsBarsOf: string[];
}
