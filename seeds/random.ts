/** Numbers that look like chance and are the same on every run: each subject has its own stream. */
export class Random {
  private a: number;
  private b: number;
  private c: number;
  private counter = 1;
  private spare: number | null = null;

  constructor(seed: number, subject: string) {
    let hash = (seed ^ 0x9e3779b9) >>> 0;
    for (let i = 0; i < subject.length; i++) hash = Math.imul(hash ^ subject.charCodeAt(i), 0x01000193) >>> 0;
    this.a = hash;
    this.b = (seed >>> 0) ^ 0x243f6a88;
    this.c = Math.imul(hash, 0x85ebca6b) >>> 0;
    for (let i = 0; i < 12; i++) this.uniform();
  }

  /** 0 up to, not including, 1 (the small fast counting generator, 32 bits). */
  uniform(): number {
    const sum = (this.a + this.b + this.counter) | 0;
    this.counter = (this.counter + 1) | 0;
    this.a = this.b ^ (this.b >>> 9);
    this.b = (this.c + (this.c << 3)) | 0;
    this.c = ((this.c << 21) | (this.c >>> 11)) + sum;
    return (sum >>> 0) / 4_294_967_296;
  }

  between(min: number, max: number): number {
    return min + (max - min) * this.uniform();
  }

  /** A size between min and max with either sign. */
  either(min: number, max: number): number {
    return this.between(min, max) * (this.chance(0.5) ? 1 : -1);
  }

  chance(probability: number): boolean {
    return this.uniform() < probability;
  }

  /** Normally distributed, mean 0, standard deviation 1 (Box and Muller). */
  normal(): number {
    if (this.spare !== null) {
      const kept = this.spare;
      this.spare = null;
      return kept;
    }
    const radius = Math.sqrt(-2 * Math.log(1 - this.uniform()));
    const angle = 2 * Math.PI * this.uniform();
    this.spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  }

  pick<T>(choices: readonly [T, ...T[]]): T {
    return choices[Math.floor(this.uniform() * choices.length)] ?? choices[0];
  }
}
