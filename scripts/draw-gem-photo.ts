import sharp from "sharp";

/**
 * Photographs for the demonstration, drawn by this program: a stone is a convex body of facet planes, light is followed
 * through it by refraction, total reflection and absorption, and what leaves it upwards is looked up in a simple studio.
 * The same options give the same picture.
 */
export type GemOutline = "round" | "oval" | "cushion" | "octagon" | "pear" | "marquise" | "cabochon" | "bead";

export type GemPhotoOptions = {
  outline: GemOutline;
  /** Own words: "purplish red", "greenish blue", "colourless", "black". */
  hue: string;
  seed: number;
  widthPx?: number;
  /** The longer side of the stone, mm; the scale bar follows it. */
  lengthMm?: number;
};

type Vector = readonly [number, number, number];
type Plane = readonly [nx: number, ny: number, nz: number, d: number];

const degrees = Math.PI / 180;

export async function drawGemPhoto({ outline, hue, seed, widthPx = 900, lengthMm = 8 }: GemPhotoOptions): Promise<Buffer> {
  const heightPx = Math.round(widthPx * 0.75);
  const random = randomFrom(seed);
  const colour = absorptionOf(hue);
  const stonePx = Math.round(heightPx * 0.64);
  const isSmooth = outline === "cabochon" || outline === "bead";
  const pixels = isSmooth ? drawSmooth({ outline, colour, sizePx: stonePx, random }) : traceFaceted({ outline, colour, sizePx: stonePx, random });
  const side = pixels.sidePx;
  const left = Math.round((widthPx - side) / 2);
  const top = Math.round((heightPx - side) / 2 - heightPx * 0.02);
  const glow = colour.isOpaque ? "#8a857c" : cssColour(throughColour(colour, 0.5));
  const [reachX, reachY] = pixels.reach;

  const background = `<svg xmlns="http://www.w3.org/2000/svg" width="${widthPx}" height="${heightPx}">
    <defs>
      <radialGradient id="g" cx="0.42" cy="0.34" r="0.9"><stop offset="0" stop-color="#f3f0ea"/><stop offset="0.55" stop-color="#dcd7cd"/><stop offset="1" stop-color="#a8a297"/></radialGradient>
      <filter id="s" x="-1" y="-1" width="3" height="3"><feGaussianBlur stdDeviation="${heightPx * 0.022}"/></filter>
      <filter id="b" x="-1" y="-1" width="3" height="3"><feGaussianBlur stdDeviation="${heightPx * 0.04}"/></filter>
    </defs>
    <rect width="100%" height="100%" fill="url(#g)"/>
    <g transform="translate(${widthPx / 2} ${heightPx * 0.48})">
      <ellipse cx="${stonePx * 0.07}" cy="${stonePx * 0.09}" rx="${stonePx * reachX * 0.5}" ry="${stonePx * reachY * 0.5}" fill="#3a3532" opacity="0.5" filter="url(#s)"/>
      <ellipse cx="${stonePx * 0.16}" cy="${stonePx * 0.2}" rx="${stonePx * reachX * 0.42}" ry="${stonePx * reachY * 0.4}" fill="${glow}" opacity="${colour.isOpaque ? 0.15 : 0.5}" filter="url(#b)"/>
    </g>
    ${scaleBar({ widthPx, heightPx, pxPerMm: stonePx / lengthMm })}
  </svg>`;

  return sharp(Buffer.from(background))
    .composite([{ input: Buffer.from(pixels.rgba), raw: { width: side, height: side, channels: 4 }, left, top }])
    .jpeg({ quality: 86, mozjpeg: false })
    .toBuffer();
}

// ---- colour ----

type Absorption = { perLength: Vector; isOpaque: boolean; bodyColour: Vector };

/** What is left of white light by a moderate path through the stone, by the word that names the hue. */
const hues: Readonly<Record<string, Vector>> = {
  red: [0.8, 0.03, 0.08],
  pink: [0.95, 0.38, 0.58],
  orange: [0.95, 0.36, 0.04],
  yellow: [0.95, 0.76, 0.1],
  green: [0.06, 0.58, 0.2],
  blue: [0.05, 0.13, 0.66],
  violet: [0.33, 0.12, 0.66],
  purple: [0.5, 0.09, 0.5],
  brown: [0.5, 0.26, 0.1],
  grey: [0.5, 0.51, 0.53],
  white: [0.93, 0.92, 0.88],
  black: [0.02, 0.02, 0.025],
  colourless: [0.96, 0.965, 0.97],
};
const modifiers: Readonly<Record<string, string>> = { reddish: "red", pinkish: "pink", orangey: "orange", yellowish: "yellow", greenish: "green", bluish: "blue", purplish: "purple", violetish: "violet", brownish: "brown", greyish: "grey" };

function absorptionOf(hue: string): Absorption {
  const words = hue.toLowerCase().split(/[^a-z]+/).filter(Boolean);
  const mains = words.flatMap((word) => hues[word] ?? []).length;
  const parts: { colour: Vector; weight: number }[] = words.flatMap((word) => {
    const main = hues[word];
    if (main) return [{ colour: main, weight: 1 / Math.max(1, mains) }];
    const side = hues[modifiers[word] ?? ""];
    return side ? [{ colour: side, weight: 0.22 }] : [];
  });
  if (parts.length === 0) parts.push({ colour: hues["colourless"]!, weight: 1 });
  const total = parts.reduce((sum, { weight }) => sum + weight, 0);
  // Mixed as filters are: by their absorptions, not by their lights.
  const depth = words.includes("light") || words.includes("pale") ? 0.45 : words.includes("dark") || words.includes("deep") ? 1.5 : 1;
  const perLength = [0, 1, 2].map((i) => (depth * parts.reduce((sum, { colour, weight }) => sum - weight * Math.log(colour[i]!), 0)) / total) as unknown as Vector;
  const isOpaque = words.includes("black") || words.includes("white") || words.includes("opaque");
  return { perLength, isOpaque, bodyColour: perLength.map((a) => Math.exp(-a)) as unknown as Vector };
}

function throughColour({ perLength }: Absorption, length: number): Vector {
  return perLength.map((a) => Math.exp(-a * length)) as unknown as Vector;
}

function cssColour(linear: Vector): string {
  return `rgb(${linear.map((part) => Math.round(toByte(part))).join(",")})`;
}

/** sRGB, with the highlights rolled off as film does. */
function toByte(linear: number): number {
  const shown = linear <= 0.6 ? linear : 0.6 + 0.4 * (1 - Math.exp(-(linear - 0.6) / 0.4));
  return 255 * (shown <= 0.0031308 ? 12.92 * shown : 1.055 * shown ** (1 / 2.4) - 0.055);
}

// ---- the studio ----

/** Light arriving from a direction (pointing away from the stone), z up: a bright tent, two soft boxes, the camera's dark shape overhead. */
function studio(x: number, y: number, z: number, isDome = false): number {
  if (z < -0.02) return 0.2 + 0.16 * (1 + z);
  const around = 0.42 + 0.4 * z;
  const key = 2.6 * smooth(0.8, 0.9, 0.5 * x * -1 + 0.52 * y + 0.69 * z);
  const fill = 1.3 * smooth(0.86, 0.95, 0.72 * x - 0.3 * y + 0.62 * z);
  if (isDome) return around + key * 1.3 + fill * 0.25;
  const low = 1.1 * smooth(0.88, 0.95, -0.1 * x - 0.86 * y + 0.5 * z);
  const camera = 0.78 * smooth(0.955, 0.985, z);
  return (around + key + fill + low) * (1 - camera);
}

function smooth(from: number, to: number, value: number): number {
  const t = Math.min(1, Math.max(0, (value - from) / (to - from)));
  return t * t * (3 - 2 * t);
}

// ---- the cut ----

/** How far the girdle's outline reaches in a direction (its support function); the longer half-axis is 1. */
function reachOf(outline: GemOutline, azimuth: number): number {
  const cosine = Math.cos(azimuth);
  const sine = Math.sin(azimuth);
  switch (outline) {
    case "oval":
      return Math.hypot(1 * cosine, 0.78 * sine);
    case "cushion": {
      // A superellipse |x/a|^p + |y/b|^p = 1 with p = 2.9 reaches (|a cos|^q + |b sin|^q)^(1/q), 1/p + 1/q = 1.
      const q = 2.9 / 1.9;
      return (Math.abs(0.94 * cosine) ** q + Math.abs(0.86 * sine) ** q) ** (1 / q);
    }
    case "octagon":
      return Math.max(1 * Math.abs(cosine) + 0.42 * Math.abs(sine), 0.72 * Math.abs(cosine) + 0.74 * Math.abs(sine));
    case "pear": {
      // A half circle about (-0.38, 0), and two wings of a wider circle that meet in the point (1, 0).
      const head = 0.62;
      const wing = 1.846;
      const across = Math.abs(sine);
      if (cosine <= 0) return head - 0.38 * cosine;
      return across >= (wing - head) / wing ? wing - 0.38 * cosine - (wing - head) * across : cosine;
    }
    case "marquise": {
      const radius = 1.35;
      const centre = Math.sqrt(radius ** 2 - 1);
      return radius * Math.abs(sine) >= centre ? radius - centre * Math.abs(sine) : Math.abs(cosine);
    }
    default:
      return 1;
  }
}

/** Facet planes n·p ≤ d, girdle at z = 0, table up. */
function cut(outline: GemOutline): Plane[] {
  const planes: Plane[] = [];
  const short = { round: 1, oval: 0.85, cushion: 0.9, octagon: 0.74, pear: 0.75, marquise: 0.6, cabochon: 1, bead: 1 }[outline];
  /** A facet through the height z above the girdle where the outline is shrunk to `share`. */
  const facet = (azimuth: number, slopeDeg: number, { side, share = 1, z = 0 }: { side: 1 | -1; share?: number; z?: number }) => {
    const slope = slopeDeg * degrees;
    const [n0, n1, n2] = [Math.cos(azimuth) * Math.sin(slope), Math.sin(azimuth) * Math.sin(slope), side * Math.cos(slope)];
    planes.push([n0, n1, n2, share * reachOf(outline, azimuth) * Math.sin(slope) + z * n2]);
  };
  if (outline === "octagon") {
    const corners = [0, 90, 180, 270].map((deg) => deg * degrees);
    // The cut corners stand square to the chord between long and short side.
    const cornerAzimuth = Math.atan2(0.28, 0.32);
    const cornerAzimuths = [cornerAzimuth, Math.PI - cornerAzimuth, Math.PI + cornerAzimuth, -cornerAzimuth];
    for (const azimuth of [...corners, ...cornerAzimuths]) {
      const reach = reachOf(outline, azimuth);
      planes.push([Math.cos(azimuth), Math.sin(azimuth), 0, reach]);
      facet(azimuth, 47, { side: 1, z: 0.02 });
      facet(azimuth, 37, { side: 1, share: 1 - 0.09 / reach, z: 0.115 });
      facet(azimuth, 27, { side: 1, share: 1 - 0.19 / reach, z: 0.19 });
      facet(azimuth, 58, { side: -1, z: -0.02 });
      facet(azimuth, 49, { side: -1, share: 1 - 0.15 / reach, z: -0.26 });
      facet(azimuth, 41, { side: -1, share: 1 - 0.33 / reach, z: -0.465 });
    }
    planes.push([0, 0, 1, 0.245]);
    return planes;
  }
  const crownHeight = 0.3 * short;
  for (let i = 0; i < 40; i += 1) {
    const azimuth = (i / 40) * 2 * Math.PI;
    planes.push([Math.cos(azimuth), Math.sin(azimuth), 0, reachOf(outline, azimuth)]);
  }
  const flatter = outline === "marquise" || outline === "pear" ? 0.94 : 1;
  for (let i = 0; i < 8; i += 1) {
    const main = ((i * 45 + 0.6) * Math.PI) / 180;
    facet(main, 34.5 * flatter, { side: 1, z: 0.02 });
    facet(main, 41 * flatter, { side: -1, z: -0.02 });
    facet(main + 22.5 * degrees, 21 * flatter, { side: 1, share: 0.6, z: crownHeight - 0.012 });
    for (const off of [11.25, -11.25]) {
      facet(main + off * degrees, 40.5 * flatter, { side: 1, z: 0.02 });
      facet(main + off * degrees, 42.4 * flatter, { side: -1, z: -0.02 });
    }
  }
  planes.push([0, 0, 1, crownHeight]);
  return planes;
}

function turned(planes: readonly Plane[], { spin, tiltX, tiltY }: { spin: number; tiltX: number; tiltY: number }): Plane[] {
  return planes.map(([x, y, z, d]) => {
    const [x1, y1] = [x * Math.cos(spin) - y * Math.sin(spin), x * Math.sin(spin) + y * Math.cos(spin)];
    const [y2, z2] = [y1 * Math.cos(tiltX) - z * Math.sin(tiltX), y1 * Math.sin(tiltX) + z * Math.cos(tiltX)];
    return [x1 * Math.cos(tiltY) + z2 * Math.sin(tiltY), y2, -x1 * Math.sin(tiltY) + z2 * Math.cos(tiltY), d];
  });
}

// ---- following light ----

type Pixels = { rgba: Uint8Array; sidePx: number; reach: readonly [number, number] };
type DrawOptions = { outline: GemOutline; colour: Absorption; sizePx: number; random: () => number };

const mostBounces = 8;
const samplesPerAxis = 2;

function traceFaceted({ outline, colour, sizePx, random }: DrawOptions): Pixels {
  const index = colour.perLength.every((a) => a < 0.15) ? 2.2 : 1.76;
  const planes = turned(cut(outline), {
    spin: outline === "round" ? random() * 6 : (random() - 0.5) * 0.5 + (outline === "pear" ? Math.PI / 2 : 0),
    tiltX: (random() - 0.5) * 0.16,
    tiltY: (random() - 0.5) * 0.16,
  });
  const count = planes.length;
  const [nx, ny, nz, nd] = [0, 1, 2, 3].map((part) => Float64Array.from(planes, (plane) => plane[part]!)) as [Float64Array, Float64Array, Float64Array, Float64Array];
  // Seen from above, the sides of the outline are set by reach; the picture leaves a margin for the tilt.
  const sidePx = Math.ceil(sizePx * 1.1);
  const rgba = new Uint8Array(sidePx * sidePx * 4);
  const [a0, a1, a2] = colour.perLength;
  const steps = samplesPerAxis * samplesPerAxis;
  const normalReflectance = ((index - 1) / (index + 1)) ** 2;
  const fresnel = (cosine: number) => normalReflectance + (1 - normalReflectance) * (1 - cosine) ** 5;

  for (let py = 0; py < sidePx; py += 1) {
    for (let px = 0; px < sidePx; px += 1) {
      let [red, green, blue, cover] = [0, 0, 0, 0];
      for (let sample = 0; sample < steps; sample += 1) {
        const startX = ((px + ((sample % samplesPerAxis) + 0.5) / samplesPerAxis) / sidePx - 0.5) * 2.2;
        const startY = (0.5 - (py + (Math.floor(sample / samplesPerAxis) + 0.5) / samplesPerAxis) / sidePx) * 2.2;
        // Into the convex body from above: the last plane entered, unless a plane was left before.
        let enterAt = -Infinity;
        let leaveAt = Infinity;
        let entry = -1;
        for (let i = 0; i < count; i += 1) {
          const approach = -nz[i]!;
          const distance = nd[i]! - (nx[i]! * startX + ny[i]! * startY + nz[i]! * 3);
          if (Math.abs(approach) < 1e-9) {
            if (distance < 0) {
              leaveAt = -Infinity;
              break;
            }
            continue;
          }
          const t = distance / approach;
          if (approach < 0) {
            if (t > enterAt) {
              enterAt = t;
              entry = i;
            }
          } else if (t < leaveAt) leaveAt = t;
        }
        if (entry < 0 || enterAt >= leaveAt) continue;
        cover += 1;

        let [x, y, z] = [startX, startY, 3 - enterAt];
        const facing = nz[entry]!;
        const mirrored = fresnel(facing);
        // What the crown itself mirrors: sharp, white, only where a lamp stands in the way.
        const sheen = mirrored * studio(2 * facing * nx[entry]!, 2 * facing * ny[entry]!, 2 * facing * facing - 1);
        // Refracted on the way in.
        const ratio = 1 / index;
        const inside = Math.sqrt(1 - ratio * ratio * (1 - facing * facing));
        let dx = (ratio * facing - inside) * nx[entry]!;
        let dy = (ratio * facing - inside) * ny[entry]!;
        let dz = -ratio + (ratio * facing - inside) * nz[entry]!;
        let strength = 1 - mirrored;
        let path = 0;
        let [lightRed, lightGreen, lightBlue] = [0, 0, 0];
        for (let bounce = 0; bounce < mostBounces && strength > 0.03; bounce += 1) {
          let nearest = Infinity;
          let hit = -1;
          for (let i = 0; i < count; i += 1) {
            const leaving = nx[i]! * dx + ny[i]! * dy + nz[i]! * dz;
            if (leaving <= 1e-9) continue;
            const t = (nd[i]! - (nx[i]! * x + ny[i]! * y + nz[i]! * z)) / leaving;
            if (t < nearest && t > -1e-6) {
              nearest = t;
              hit = i;
            }
          }
          if (hit < 0) break;
          x += dx * nearest;
          y += dy * nearest;
          z += dz * nearest;
          path += nearest;
          const cosine = nx[hit]! * dx + ny[hit]! * dy + nz[hit]! * dz;
          const outsideSquared = 1 - index * index * (1 - cosine * cosine);
          let kept = 1;
          if (outsideSquared > 0) {
            const outside = Math.sqrt(outsideSquared);
            kept = fresnel(outside);
            const bend = outside - index * cosine;
            const light = strength * (1 - kept) * studio(index * dx + bend * nx[hit]!, index * dy + bend * ny[hit]!, index * dz + bend * nz[hit]!);
            lightRed += light * Math.exp(-a0! * path);
            lightGreen += light * Math.exp(-a1! * path);
            lightBlue += light * Math.exp(-a2! * path);
          }
          strength *= kept;
          dx -= 2 * cosine * nx[hit]!;
          dy -= 2 * cosine * ny[hit]!;
          dz -= 2 * cosine * nz[hit]!;
        }
        // Light that is still on its way has met every lamp by now: the tent's mean.
        const rest = strength * 0.5;
        red += 1.25 * (lightRed + rest * Math.exp(-a0! * path)) + sheen * 0.8;
        green += 1.25 * (lightGreen + rest * Math.exp(-a1! * path)) + sheen * 0.8;
        blue += 1.25 * (lightBlue + rest * Math.exp(-a2! * path)) + sheen * 0.8;
      }
      if (cover > 0) {
        const at = (py * sidePx + px) * 4;
        rgba[at] = toByte(red / cover);
        rgba[at + 1] = toByte(green / cover);
        rgba[at + 2] = toByte(blue / cover);
        rgba[at + 3] = (255 * cover) / steps;
      }
    }
  }
  return { rgba, sidePx, reach: outline === "pear" ? [0.7, 1] : [reachOf(outline, 0), reachOf(outline, Math.PI / 2)] };
}

/** Polished domes and beads: a body that scatters, a lit far side, the lamps mirrored in the polish. */
function drawSmooth({ outline, colour, sizePx, random }: DrawOptions): Pixels {
  const sidePx = Math.ceil(sizePx * 1.1);
  const rgba = new Uint8Array(sidePx * sidePx * 4);
  const isBead = outline === "bead";
  const turn = (random() - 0.5) * 0.8;
  const balls = isBead
    ? Array.from({ length: 4 }, (_, i) => ({ x: (i - 1.5) * 0.53 * Math.cos(turn * 0.4), y: (i - 1.5) * 0.53 * Math.sin(turn * 0.4) + 0.2 * Math.cos((i - 1.5) * 0.9), a: 0.265, b: 0.265, c: 0.265 }))
    : [{ x: 0, y: 0, a: 1, b: 0.8, c: 0.62 }];
  const [cosine, sine] = [Math.cos(isBead ? 0 : turn), Math.sin(isBead ? 0 : turn)];
  const steps = 9;
  for (let py = 0; py < sidePx; py += 1) {
    for (let px = 0; px < sidePx; px += 1) {
      let cover = 0;
      const sum = [0, 0, 0];
      for (let sample = 0; sample < steps; sample += 1) {
        const seenX = ((px + ((sample % 3) + 0.5) / 3) / sidePx - 0.5) * 2.2;
        const seenY = (0.5 - (py + (Math.floor(sample / 3) + 0.5) / 3) / sidePx) * 2.2;
        for (const ball of balls) {
          const x = ((seenX - ball.x) * cosine + (seenY - ball.y) * sine) / ball.a;
          const y = (-(seenX - ball.x) * sine + (seenY - ball.y) * cosine) / ball.b;
          const far = x * x + y * y;
          if (far >= 1) continue;
          const z = Math.sqrt(1 - far);
          const length = Math.hypot(x / ball.a, y / ball.b, z / ball.c);
          const [localX, localY, up] = [x / ball.a / length, y / ball.b / length, z / ball.c / length];
          const [normalX, normalY] = [localX * cosine - localY * sine, localX * sine + localY * cosine];
          const facing = up;
          const mirrored = 0.05 + 0.95 * (1 - facing) ** 5;
          const mirroredLight = studio(2 * facing * normalX, 2 * facing * normalY, 2 * facing * facing - 1, true);
          const sheen = mirrored * mirroredLight + 0.6 * smooth(1.1, 3.4, mirroredLight);
          const lit = Math.max(0, -0.5 * normalX + 0.52 * normalY + 0.69 * up);
          // Light from the key lamp gathers under the far side of a clear dome.
          const gathered = colour.isOpaque ? 0 : 0.75 * smooth(0.1, 0.85, 0.62 * normalX - 0.62 * normalY + 0.2);
          const depth = colour.isOpaque ? 1 : 0.35 + 0.85 * z;
          const body = 0.2 + 0.62 * lit + gathered;
          for (let i = 0; i < 3; i += 1) sum[i]! += body * Math.exp(-colour.perLength[i]! * depth) + sheen;
          cover += 1;
          break;
        }
      }
      if (cover > 0) {
        const at = (py * sidePx + px) * 4;
        for (let i = 0; i < 3; i += 1) rgba[at + i] = toByte(sum[i]! / cover);
        rgba[at + 3] = (255 * cover) / steps;
      }
    }
  }
  return { rgba, sidePx, reach: isBead ? [1, 0.42] : [1, 0.82] };
}

// ---- the scale ----

/** Strokes of the few signs that the scale needs, on a grid 4 wide and 7 high: the machine that draws may have no fonts. */
const signs: Readonly<Record<string, string>> = {
  "1": "M1 1.5 2.4 0V7",
  "2": "M.4 1.6C.6.4 1.2 0 2 0 3 0 3.6.7 3.6 1.8 3.6 3.4.4 5 .4 7H3.6",
  "5": "M3.4 0H.8L.6 3.1C1 2.7 1.5 2.5 2 2.5 3 2.5 3.7 3.4 3.7 4.7 3.7 6.1 3 7 1.9 7 1.1 7 .5 6.6.3 5.9",
  "0": "M2 0C3.1 0 3.7 1.3 3.7 3.5S3.1 7 2 7 .3 5.7.3 3.5.9 0 2 0Z",
  m: "M.3 7V2.6M.3 3.8C.5 3 1 2.5 1.5 2.5 2 2.5 2.2 2.9 2.2 3.6V7M2.2 3.8C2.4 3 2.8 2.5 3.3 2.5 3.9 2.5 4.1 2.9 4.1 3.6V7",
};

function scaleBar({ widthPx, heightPx, pxPerMm }: { widthPx: number; heightPx: number; pxPerMm: number }): string {
  const lengthMm = [10, 5, 2, 1].find((mm) => mm * pxPerMm <= widthPx * 0.24) ?? 1;
  const [x, y, unit] = [widthPx * 0.04, heightPx * 0.93, heightPx / 260];
  const ticks = Array.from({ length: lengthMm + 1 }, (_, mm) => {
    const isEnd = mm === 0 || mm === lengthMm;
    return `M${x + mm * pxPerMm} ${y}v${-(isEnd ? 6 : 3.5) * unit}`;
  }).join("");
  const label = [...`${lengthMm} mm`].reduce(
    ({ at, drawn }, sign) => ({ at: at + (sign === " " ? 2.4 : sign === "m" ? 5.6 : 5), drawn: drawn + (signs[sign] ? `<path transform="translate(${at} 0)" d="${signs[sign]}"/>` : "") }),
    { at: 0, drawn: "" },
  ).drawn;
  return `<g fill="none" stroke="#37322d" stroke-linecap="round" stroke-linejoin="round">
    <path stroke-width="${1.1 * unit}" d="M${x} ${y}h${lengthMm * pxPerMm}${ticks}"/>
    <g stroke-width="0.8" transform="translate(${x + lengthMm * pxPerMm + 5 * unit} ${y - 6.6 * unit}) scale(${0.95 * unit})">${label}</g>
  </g>`;
}

/** A small generator of even numbers in [0, 1): the same seed, the same picture. */
function randomFrom(seed: number): () => number {
  let state = (Math.imul(seed | 0, 2654435761) >>> 0) + 1;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 4294967296;
  };
}
