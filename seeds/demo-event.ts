import type { CellCreate, MountCreate } from "@beadroll/domain/schemas/cell";
import type { DrawingCreate, ModelSeamCreate } from "@beadroll/domain/schemas/drawing";
import type { InspectionCreate } from "@beadroll/domain/schemas/inspection";
import type { CertificateCreate, LotCreate, LotPatch } from "@beadroll/domain/schemas/lot";
import type { PartCreate, PieceCreate } from "@beadroll/domain/schemas/part";
import type { PassCreate } from "@beadroll/domain/schemas/pass";
import type { PersonCreate, QualificationCreate } from "@beadroll/domain/schemas/person";
import type { ProcedureCreate, ProcedurePatch } from "@beadroll/domain/schemas/procedure";
import type { ScanCreate } from "@beadroll/domain/schemas/scan";
import type { ApiKeyCreate, UserCreate } from "@beadroll/domain/schemas/user";

/** A thing of the scenario, by a name that only the scenario knows, e.g. `part-0418`. */
export type Ref = string;

/** A seam of the scenario: it is named by its part and its number on the drawing. */
export interface SeamRef {
  readonly part: Ref;
  readonly number: string;
}

export interface DemoFile {
  readonly name: string;
  readonly bytes: Uint8Array;
}

/** Who acts before anybody has an account: the administrator's person and account are made so, nothing else. */
export const SETUP_ACTOR = "setup";

interface Act<Kind extends string> {
  readonly kind: Kind;
  /** When it happens, RFC 3339 in UTC. */
  readonly at: string;
  /** Login of the user, name of the machine's key, or {@link SETUP_ACTOR}. */
  readonly by: string;
}

type PersonMade = Act<"person"> & { readonly ref: Ref; readonly fields: PersonCreate };
type QualificationAdded = Act<"qualification"> & {
  readonly person: Ref;
  readonly fields: QualificationCreate;
};
type UserMade = Act<"user"> & {
  readonly ref: Ref;
  readonly person: Ref | null;
  readonly fields: Omit<UserCreate, "person_id">;
};
type KeyMade = Act<"key"> & {
  readonly ref: Ref;
  readonly cell: Ref | null;
  readonly fields: Omit<ApiKeyCreate, "cell_id">;
  /** The secret to give it: known, so that the demo's cell computers can use it. */
  readonly secret: string;
};
type CellMade = Act<"cell"> & { readonly ref: Ref; readonly fields: CellCreate };
type ProcedureMade = Act<"procedure"> & { readonly ref: Ref; readonly fields: ProcedureCreate };
/** Approval or withdrawal of a procedure. */
type ProcedureDecided = Act<"procedure-approval"> & {
  readonly procedure: Ref;
  readonly fields: ProcedurePatch;
};
type DrawingMade = Act<"drawing"> & { readonly ref: Ref; readonly fields: DrawingCreate };
type ModelSeamMade = Act<"model-seam"> & {
  readonly drawing: Ref;
  readonly procedure: Ref | null;
  readonly fields: Omit<ModelSeamCreate, "procedure_id">;
};
type LotReceived = Act<"lot"> & { readonly ref: Ref; readonly fields: LotCreate };
type LotDecided = Act<"lot-state"> & { readonly lot: Ref; readonly fields: LotPatch };
type CertificateAdded = Act<"certificate"> & {
  readonly lot: Ref;
  readonly fields: Omit<CertificateCreate, "file_digest">;
  readonly file: DemoFile;
};
type PartStarted = Act<"part"> & {
  readonly ref: Ref;
  readonly drawing: Ref;
  readonly parent: Ref | null;
  readonly fields: Omit<PartCreate, "drawing_id" | "parent_tag">;
};
type PieceBuiltIn = Act<"piece"> & {
  readonly part: Ref;
  readonly lot: Ref;
  readonly fields: Omit<PieceCreate, "lot_tag">;
};
type LotMounted = Act<"mount"> & {
  readonly cell: Ref;
  readonly lot: Ref;
  readonly fields: Omit<MountCreate, "cell_tag" | "lot_tag">;
};
type ScanTaken = Act<"scan"> & {
  readonly seam: SeamRef;
  readonly cell: Ref;
  readonly fields: Omit<ScanCreate, "part_tag" | "cell_tag">;
  readonly file: DemoFile;
};
type PassWelded = Act<"pass"> & {
  readonly seam: SeamRef;
  readonly cell: Ref;
  readonly operator: Ref;
  readonly fields: Omit<PassCreate, "operator_tag" | "part_tag" | "cell_tag">;
  readonly file: DemoFile;
};
type SeamInspected = Act<"inspection"> & { readonly seam: SeamRef; readonly fields: InspectionCreate };

/** One thing that happened in the shop: who recorded what, when. */
export type DemoEvent =
  | PersonMade
  | QualificationAdded
  | UserMade
  | KeyMade
  | CellMade
  | ProcedureMade
  | ProcedureDecided
  | DrawingMade
  | ModelSeamMade
  | LotReceived
  | LotDecided
  | CertificateAdded
  | PartStarted
  | PieceBuiltIn
  | LotMounted
  | ScanTaken
  | PassWelded
  | SeamInspected;

/** An event whose payload is made only when its turn comes, so that no more than one file is in memory. */
export interface PlannedEvent {
  readonly at_ms: number;
  readonly make: () => DemoEvent;
}
