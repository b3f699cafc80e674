import type { Certificate, Lot } from "@beadroll/domain/schemas/lot";
import type { Ref } from "../demo-event.ts";

/** The inspection document that came with a lot. */
export interface ShopCertificate {
  readonly type: Certificate["type"];
  readonly number: string;
  readonly chemistry?: Certificate["chemistry"];
  readonly mechanical?: Certificate["mechanical"];
}

/** A lot as goods-in receives it. */
export interface ShopLot {
  readonly ref: Ref;
  readonly kind: Lot["kind"];
  readonly number: string;
  readonly supplier: string;
  readonly grade: string;
  readonly dimension: string;
  readonly thickness_mm: number | null;
  readonly quantity: number;
  readonly unit: Lot["unit"];
  /** Working hour it came in; 0 is before work begins. */
  readonly received_hour: number;
  readonly certificate: ShopCertificate;
}

type Product = Omit<ShopLot, "ref" | "number" | "quantity" | "received_hour" | "certificate">;

const steel = (
  kind: Lot["kind"],
  supplier: string,
  grade: string,
  dimension: string,
  thickness_mm: number,
): Product => ({ kind, supplier, grade, dimension, thickness_mm, unit: "pcs" });

const BASE_12 = steel("plate", "Nordhall Steel", "S355J2", "12 x 2000 x 6000", 12);
const PLATE_10 = steel("plate", "Nordhall Steel", "S355J2", "10 x 1500 x 6000", 10);
const DECK_10 = steel("plate", "Ostervik Rolling", "S355J2", "10 x 2000 x 4000", 10);
const PLATE_8 = steel("plate", "Ostervik Rolling", "S275JR", "8 x 1500 x 3000", 8);
const PLATE_6 = steel("plate", "Ostervik Rolling", "S275JR", "6 x 1250 x 2500", 6);
const LUG_20 = steel("plate", "Nordhall Steel", "S460N", "20 x 1000 x 2000", 20);
const RING = steel("tube", "Brennmoor Tubes", "S355J2H", "219.1 x 10 x 6000", 10);
const RAIL = steel("section", "Ostervik Rolling", "S355J2", "Flat 60 x 20 x 6000", 20);

const consumable = (
  kind: Lot["kind"],
  supplier: string,
  grade: string,
  dimension: string,
): Omit<Product, "unit"> => ({ kind, supplier, grade, dimension, thickness_mm: null });

const SOLID: Product = {
  ...consumable("wire", "Sundmar Wire", "G 42 4 M21 3Si1", "1.2 mm, spools of 15 kg"),
  unit: "kg",
};
const METAL_CORED: Product = {
  ...consumable("wire", "Sundmar Wire", "T 46 4 M M21 2 H5", "1.2 mm, spools of 16 kg"),
  unit: "kg",
};
const FLUX_CORED: Product = {
  ...consumable("wire", "Sundmar Wire", "T 46 2 P M21 1 H5", "1.2 mm, spools of 16 kg"),
  unit: "kg",
};
const M21: Product = {
  ...consumable("gas", "Ostvale Gases", "ISO 14175-M21-ArC-18", "Bundle 12 x 50 l, 200 bar"),
  unit: "m3",
};

const heat = (
  product: Product,
  number: string,
  quantity: number,
  received_hour: number,
  certificate: ShopCertificate,
): ShopLot => ({ ...product, ref: `lot-${number}`, number, quantity, received_hour, certificate });

const proof = (
  type: Certificate["type"],
  number: string,
  [C, Si, Mn, P, S]: readonly [number, number, number, number, number],
  mechanical: Certificate["mechanical"],
  more: Certificate["chemistry"] = {},
): ShopCertificate => ({ type, number, chemistry: { C, Si, Mn, P, S, ...more }, mechanical });

const pulled = (yield_mpa: number, tensile_mpa: number, elongation_pct: number, impact_j?: number) => ({
  yield_mpa,
  tensile_mpa,
  elongation_pct,
  ...(impact_j === undefined ? {} : { impact_j }),
});

/** The heat whose yield strength stands below what its grade promises for this thickness (355 MPa to 16 mm). */
export const DOUBTFUL_LOT = "lot-H48977";
/** The heat that was used once and then quarantined. */
export const QUARANTINED_LOT = "lot-H51106";

const Al = 0.034;

const STEEL: readonly ShopLot[] = [
  heat(
    BASE_12,
    "H50217",
    6,
    0,
    proof("3.1", "A-77120", [0.16, 0.21, 1.42, 0.014, 0.006], pulled(389, 528, 27, 94), { Al }),
  ),
  heat(
    BASE_12,
    "H50388",
    6,
    88,
    proof("3.1", "A-77342", [0.15, 0.24, 1.39, 0.012, 0.005], pulled(381, 521, 28, 101), { Al }),
  ),
  heat(
    PLATE_10,
    "H48812",
    5,
    0,
    proof("3.1", "A-76984", [0.17, 0.2, 1.45, 0.015, 0.007], pulled(396, 537, 26, 82), { Al }),
  ),
  heat(
    PLATE_10,
    "H48977",
    4,
    24,
    proof("3.1", "A-77051", [0.14, 0.18, 1.27, 0.019, 0.009], pulled(351, 498, 27, 58), { Al }),
  ),
  heat(
    PLATE_10,
    "H49120",
    6,
    96,
    proof("3.1", "A-77365", [0.16, 0.22, 1.41, 0.013, 0.006], pulled(388, 530, 27, 88), { Al }),
  ),
  heat(
    PLATE_10,
    "H51106",
    3,
    118,
    proof("3.1", "A-77410", [0.18, 0.19, 1.48, 0.021, 0.012], pulled(402, 549, 24, 41), { Al }),
  ),
  heat(
    DECK_10,
    "H49544",
    5,
    0,
    proof("3.1", "R-20817", [0.15, 0.23, 1.4, 0.013, 0.006], pulled(384, 524, 27, 90), { Al }),
  ),
  heat(
    DECK_10,
    "H49561",
    5,
    72,
    proof("3.1", "R-20862", [0.16, 0.21, 1.43, 0.012, 0.005], pulled(391, 533, 26, 97), { Al }),
  ),
  heat(
    DECK_10,
    "H49730",
    4,
    160,
    proof("3.2", "R-20921", [0.15, 0.22, 1.38, 0.011, 0.004], pulled(386, 527, 28, 112), { Al }),
  ),
  heat(
    PLATE_8,
    "H47120",
    8,
    0,
    proof("3.1", "R-20744", [0.16, 0.2, 0.92, 0.018, 0.011], pulled(302, 451, 29, 64)),
  ),
  heat(
    PLATE_8,
    "H47391",
    8,
    112,
    proof("3.1", "R-20889", [0.17, 0.18, 0.95, 0.02, 0.01], pulled(297, 446, 30, 59)),
  ),
  heat(
    PLATE_6,
    "H46008",
    10,
    0,
    proof("2.2", "R-20690", [0.15, 0.18, 0.88, 0.02, 0.012], pulled(308, 448, 29)),
  ),
  heat(
    LUG_20,
    "H60233",
    2,
    0,
    proof("3.2", "A-76811", [0.15, 0.36, 1.46, 0.01, 0.003], pulled(472, 601, 24, 138), {
      Al,
      V: 0.08,
      Nb: 0.03,
    }),
  ),
  heat(
    RING,
    "T7718",
    4,
    0,
    proof("3.1", "BT-5531", [0.17, 0.25, 1.36, 0.014, 0.007], pulled(378, 519, 26, 76), { Al }),
  ),
  heat(
    RING,
    "T7725",
    4,
    120,
    proof("3.1", "BT-5590", [0.16, 0.24, 1.38, 0.013, 0.006], pulled(383, 522, 27, 80), { Al }),
  ),
  heat(
    RAIL,
    "F33107",
    12,
    0,
    proof("3.1", "R-20703", [0.17, 0.22, 1.37, 0.016, 0.009], pulled(361, 512, 26, 70), { Al }),
  ),
];

const CONSUMABLES: readonly ShopLot[] = [
  heat(
    SOLID,
    "W-3391",
    90,
    0,
    proof("3.1", "SW-9104", [0.07, 0.85, 1.46, 0.012, 0.01], pulled(448, 552, 28, 92), { Cu: 0.11 }),
  ),
  heat(
    SOLID,
    "W-3402",
    90,
    64,
    proof("3.1", "SW-9150", [0.08, 0.83, 1.44, 0.011, 0.009], pulled(451, 556, 27, 88), { Cu: 0.12 }),
  ),
  heat(
    SOLID,
    "W-3417",
    90,
    150,
    proof("2.2", "SW-9198", [0.07, 0.86, 1.47, 0.012, 0.01], pulled(446, 550, 28)),
  ),
  heat(
    METAL_CORED,
    "M-2207",
    96,
    0,
    proof("3.1", "SW-9077", [0.05, 0.62, 1.38, 0.011, 0.012], pulled(489, 571, 26, 84), { Ni: 0.03 }),
  ),
  heat(
    METAL_CORED,
    "M-2214",
    96,
    100,
    proof("3.1", "SW-9161", [0.05, 0.6, 1.41, 0.012, 0.011], pulled(493, 575, 25, 80), { Ni: 0.03 }),
  ),
  heat(
    FLUX_CORED,
    "F-0881",
    64,
    0,
    proof("3.1", "SW-9090", [0.05, 0.45, 1.22, 0.013, 0.01], pulled(502, 581, 25, 71), { Ni: 0.36 }),
  ),
  heat(M21, "G-118", 128, 0, { type: "2.1", number: "OG-44018" }),
  heat(M21, "G-119", 128, 0, { type: "2.1", number: "OG-44019" }),
  heat(M21, "G-121", 128, 60, { type: "2.1", number: "OG-44127" }),
  heat(M21, "G-123", 128, 84, { type: "2.1", number: "OG-44190" }),
  heat(M21, "G-124", 128, 150, { type: "2.1", number: "OG-44236" }),
];

/** Every lot of the scenario: plate, section and tube by heat, wire and gas by lot. */
export const LOTS: readonly ShopLot[] = [...STEEL, ...CONSUMABLES];
