import type { DrawnCloud } from "@beadroll/domain/measure/cloud/cloud-codec";
import { offModel } from "@beadroll/domain/measure/cloud/off-model";
import { nominalProfile } from "@beadroll/domain/measure/joints/nominal-profile";
import { lineFrames, type SeamFrames, toPart } from "@beadroll/domain/measure/seam/seam-frames";
import { temperColour } from "@beadroll/domain/quality/temper";
import { resolveLimits, type SeamModel } from "@beadroll/domain/schemas/seam-model";
import {
  BufferGeometry,
  Color,
  DoubleSide,
  Float32BufferAttribute,
  Line,
  LineBasicMaterial,
  Mesh,
  MeshBasicMaterial,
  PerspectiveCamera,
  Points,
  PointsMaterial,
  Scene,
  Spherical,
  Vector3,
  WebGLRenderer,
} from "three";
import { OrbitControls } from "three/examples/jsm/controls/OrbitControls.js";

const FIELD_DEG = 40;

/** The nominal faces are drawn this far from the root, mm: as far as a scanner sees. */
const FACES_MM = 25;

const POINT_PX = 2;
const DENSEST = 2;

/** A colour of the page's own, in the theme in force. */
const pageColour = (name: string): Color =>
  new Color(getComputedStyle(document.documentElement).getPropertyValue(name).trim() || "#808080");

/** Colours of points by the share of the limit that they lie off the model. */
function pointColours(off_mm: Float32Array, limit_mm: number): Float32Array {
  const colours = new Float32Array(3 * off_mm.length);
  const steps = Array.from({ length: 102 }, (_, i) => new Color(temperColour(i === 101 ? 1.01 : i / 100)));
  off_mm.forEach((off, i) => {
    const share = off / limit_mm;
    const colour = steps[share > 1 ? 101 : Math.round(100 * share)];
    colour?.toArray(colours, 3 * i);
  });
  return colours;
}

/** A face's outline cut to what a scanner sees. */
function shortened(points: readonly (readonly [number, number])[]): (readonly [number, number])[] {
  const far = Math.max(...points.map(([l, n]) => Math.hypot(l, n)));
  const by = Math.min(1, FACES_MM / Math.max(1, far));
  return points.map(([l, n]) => [l * by, n * by] as const);
}

/** The nominal faces of a plate along the seam, as triangles between one station and the next. */
function faceGeometry(frames: SeamFrames, outline: readonly (readonly [number, number])[]): BufferGeometry {
  const corners: number[] = [];
  const triangles: number[] = [];
  const across = outline.length;
  for (let i = 0; i < frames.count; i++)
    for (const [l, n] of outline) corners.push(...toPart(frames, i, l, n));
  for (let i = 0; i + 1 < frames.count; i++)
    for (let k = 0; k + 1 < across; k++) {
      const [a, b] = [i * across + k, (i + 1) * across + k];
      triangles.push(a, a + 1, b, b, a + 1, b + 1);
    }
  const geometry = new BufferGeometry();
  geometry.setAttribute("position", new Float32BufferAttribute(corners, 3));
  geometry.setIndex(triangles);
  return geometry;
}

/** Points, nominal faces and seam line of one scan, drawn anew only when something has changed. */
export class CloudScene {
  readonly #renderer: WebGLRenderer;
  readonly #camera = new PerspectiveCamera(FIELD_DEG, 1, 0.1, 20_000);
  readonly #scene = new Scene();
  readonly #controls: OrbitControls;
  readonly #frames: SeamFrames;
  readonly #line = new LineBasicMaterial();
  readonly #mark = new LineBasicMaterial({ depthTest: false });
  readonly #faces = new MeshBasicMaterial({
    side: DoubleSide,
    transparent: true,
    opacity: 0.22,
    depthWrite: false,
  });
  /** The nominal section as one line, from plate A's far end over the root to plate B's. */
  readonly #outline: readonly (readonly [number, number])[];
  readonly #section: Line;
  readonly #resized: ResizeObserver;
  #isAsked = false;

  /** The limit that colours are a share of: the largest lateral deviation that may be followed, mm. */
  static limitOf(model: SeamModel): number {
    return resolveLimits(model.limits).adapt.lateral_mm;
  }

  /** Draws into an element; null where the browser has no WebGL. */
  static make(holder: HTMLElement, model: SeamModel, cloud: DrawnCloud): CloudScene | null {
    try {
      return new CloudScene(holder, new WebGLRenderer({ antialias: true }), model, cloud);
    } catch {
      // The renderer throws where no context can be had; the page then says so in words.
      return null;
    }
  }

  private constructor(holder: HTMLElement, renderer: WebGLRenderer, model: SeamModel, cloud: DrawnCloud) {
    this.#renderer = renderer;
    this.#frames = lineFrames(model);
    renderer.setPixelRatio(Math.min(DENSEST, window.devicePixelRatio));
    holder.append(renderer.domElement);
    this.#controls = new OrbitControls(this.#camera, renderer.domElement);
    this.#controls.addEventListener("change", () => this.#ask());
    this.#addCloud(cloud, model);
    this.#addModel(model);
    const { plate_a, plate_b } = nominalProfile(model);
    this.#outline = [...shortened(plate_a), ...shortened(plate_b)];
    this.#section = new Line(new BufferGeometry(), this.#mark);
    this.#section.renderOrder = 1;
    this.#section.visible = false;
    this.#scene.add(this.#section);
    this.takeColours();
    this.#resized = new ResizeObserver(() => this.#resize(holder));
    this.#resized.observe(holder);
    this.#resize(holder);
    this.reset();
  }

  #addCloud({ xyz_mm }: DrawnCloud, model: SeamModel): void {
    const geometry = new BufferGeometry();
    geometry.setAttribute("position", new Float32BufferAttribute(xyz_mm, 3));
    const colours = pointColours(offModel(model, xyz_mm), CloudScene.limitOf(model));
    geometry.setAttribute("color", new Float32BufferAttribute(colours, 3));
    const material = new PointsMaterial({ size: POINT_PX, sizeAttenuation: false, vertexColors: true });
    this.#scene.add(new Points(geometry, material));
  }

  #addModel(model: SeamModel): void {
    const { plate_a, plate_b } = nominalProfile(model);
    for (const outline of [plate_a, plate_b])
      this.#scene.add(new Mesh(faceGeometry(this.#frames, shortened(outline)), this.#faces));
    const geometry = new BufferGeometry();
    geometry.setAttribute(
      "position",
      new Float32BufferAttribute(Float32Array.from(this.#frames.points_mm), 3),
    );
    this.#scene.add(new Line(geometry, this.#line));
  }

  /** Reads the page's colours again, as after a change of theme. */
  takeColours(): void {
    this.#renderer.setClearColor(pageColour("--sheet"), 1);
    this.#line.color = pageColour("--ink");
    this.#faces.color = pageColour("--ash");
    this.#mark.color = pageColour("--stop");
    this.#ask();
  }

  /** Marks a station by its nominal section; none for null. */
  markStation(station_mm: number | null): void {
    this.#section.visible = station_mm !== null;
    if (station_mm !== null) {
      const { stations_mm } = this.#frames;
      let i = 0;
      for (let k = 1; k < stations_mm.length; k++)
        if (Math.abs(stations_mm[k]! - station_mm) < Math.abs(stations_mm[i]! - station_mm)) i = k;
      const corners = this.#outline.flatMap(([l, n]) => toPart(this.#frames, i, l, n));
      this.#section.geometry.dispose();
      this.#section.geometry = new BufferGeometry();
      this.#section.geometry.setAttribute("position", new Float32BufferAttribute(corners, 3));
    }
    this.#ask();
  }

  /** Turns the view about the seam, radians. */
  turn(around_rad: number, over_rad: number): void {
    const off = this.#camera.position.clone().sub(this.#controls.target);
    const place = new Spherical().setFromVector3(off);
    place.theta += around_rad;
    place.phi = Math.min(Math.PI - 0.05, Math.max(0.05, place.phi + over_rad));
    this.#camera.position.copy(this.#controls.target).add(new Vector3().setFromSpherical(place));
    this.#controls.update();
    this.#ask();
  }

  /** Comes nearer by a factor. */
  zoom(by: number): void {
    const { target } = this.#controls;
    this.#camera.position.sub(target).divideScalar(by).add(target);
    this.#controls.update();
    this.#ask();
  }

  /** Shows the whole seam, from the open side of the joint. */
  reset(): void {
    const { count, points_mm, normals, laterals, tangents, length_mm } = this.#frames;
    const middle = Math.floor(count / 2);
    const at = (values: Float64Array) => new Vector3().fromArray(Array.from(values), 3 * middle);
    const target = at(points_mm);
    const from = at(normals)
      .multiplyScalar(0.75)
      .sub(at(laterals).multiplyScalar(0.75))
      .sub(at(tangents).multiplyScalar(0.7));
    this.#camera.up.copy(at(normals));
    this.#controls.target.copy(target);
    this.#camera.position.copy(target).add(from.normalize().multiplyScalar(Math.max(90, 1.1 * length_mm)));
    this.#controls.update();
    this.#ask();
  }

  #resize(holder: HTMLElement): void {
    const { clientWidth, clientHeight } = holder;
    if (clientWidth === 0 || clientHeight === 0) return;
    this.#renderer.setSize(clientWidth, clientHeight);
    this.#camera.aspect = clientWidth / clientHeight;
    this.#camera.updateProjectionMatrix();
    this.#ask();
  }

  /** Draws once before the next frame, however many things changed. */
  #ask(): void {
    if (this.#isAsked) return;
    this.#isAsked = true;
    requestAnimationFrame(() => {
      this.#isAsked = false;
      this.#renderer.render(this.#scene, this.#camera);
    });
  }

  /** Gives back what the graphics card holds. */
  dispose(): void {
    this.#isAsked = true;
    this.#resized.disconnect();
    this.#controls.dispose();
    this.#scene.traverse((one) => {
      if (one instanceof Points || one instanceof Mesh || one instanceof Line) {
        one.geometry.dispose();
        one.material.dispose();
      }
    });
    this.#renderer.dispose();
    this.#renderer.domElement.remove();
  }
}
