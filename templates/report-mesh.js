"use strict";

// The tubes as triangles. A tube comes as columns along its wall lines; each column gives the outer and the inner skin's place
// round the axis and where both skins begin and end along it.

const bytesOf = text => Uint8Array.from(atob(text), c => c.charCodeAt(0));

// Reads a scene and lays all tubes into shared arrays.
function readFrame(scene) {
  const tubes = scene.tubes.map(readTube);
  const sum = key => tubes.reduce((n, t) => n + t[key].length, 0);
  const mesh = {
    tubes,
    local: new Float32Array(sum("points")),      // along, towards the top line, towards clock 90 degrees
    normals: new Float32Array(sum("points")),
    positions: new Float32Array(sum("points")),
    inside: new Uint8Array(sum("points") / 3),
    triangles: new Uint32Array(sum("triangles")),
    edges: new Uint32Array(sum("edges")),
    owner: new Uint32Array(sum("points") / 3),
  };
  let [point, triangle, edge] = [0, 0, 0];
  tubes.forEach((tube, index) => {
    tube.first = point;
    tube.count = tube.points.length / 3;
    tube.firstTriangle = triangle;
    tube.triangleCount = tube.triangles.length;
    mesh.local.set(tube.points, 3 * point);
    for (let i = 0; i < tube.count; i++) {
      const [n0, n1, n2] = [tube.normals[3 * i], tube.normals[3 * i + 1], tube.normals[3 * i + 2]];
      const axis = axisAt(tube, tube.points[3 * i]);
      for (let k = 0; k < 3; k++) {
        mesh.normals[3 * (point + i) + k] = n0 * axis.x[k] + n1 * axis.z[k] - n2 * axis.y[k];
      }
      mesh.owner[point + i] = index;
      mesh.inside[point + i] = tube.insides[i];
    }
    tube.triangles.forEach(v => { mesh.triangles[triangle++] = v + point; });
    tube.edges.forEach(v => { mesh.edges[edge++] = v + point; });
    point += tube.count;
    delete tube.points; delete tube.normals; delete tube.insides; delete tube.triangles; delete tube.edges;
  });
  return mesh;
}

function readTube(tube) {
  const VALUES = 8;
  const raw = new Int16Array(bytesOf(tube.columns).buffer);
  const columns = [];
  for (let i = 0; i < raw.length; i += VALUES) {
    const v = Array.from(raw.subarray(i, i + VALUES), n => n * tube.step);
    columns.push({ outer: [v[0], v[1], v[4], v[5]], inner: [v[2], v[3], v[6], v[7]] });
  }
  const motions = (tube.motions || []).map(text => new Float32Array(bytesOf(text).buffer));
  const made = Object.assign({ points: [], normals: [], insides: [], triangles: [], edges: [] }, tube, { motions });
  const even = Math.min(24, Math.max(1, (tube.places || [0, 1]).length - 1));
  const rings = Math.min(240, Math.max(even, ...tube.pieces.map(p => p.radius > 0 ? Math.ceil(tube.length / (0.1 * p.radius)) : 1)));
  const isHollow = columns.some(c => Math.hypot(c.inner[0], c.inner[1]) > 1e-3);
  addSkin(made, columns.map(c => c.outer), rings, 1);
  if (isHollow) {
    addSkin(made, columns.map(c => c.inner), rings, -1);
  }
  addFace(made, columns, 2, -1);
  addFace(made, columns, 3, 1);
  return made;
}

// A skin: columns by rings, its normals square to the outline.
function addSkin(made, skin, rings, sign) {
  const first = made.points.length / 3;
  const normals = outlineNormals(skin);
  skin.forEach((column, c) => {
    for (let r = 0; r <= rings; r++) {
      made.points.push(column[2] + (column[3] - column[2]) * r / rings, column[0], column[1]);
      made.normals.push(0, sign * normals[c][0], sign * normals[c][1]);
      made.insides.push(sign < 0 ? 1 : 0);
    }
    if (c > 0) {
      for (let r = 0; r < rings; r++) {
        const a = first + (c - 1) * (rings + 1) + r;
        const b = a + rings + 1;
        made.triangles.push(a, b, a + 1, b, b + 1, a + 1);
      }
      for (const r of [0, rings]) {
        made.edges.push(first + (c - 1) * (rings + 1) + r, first + c * (rings + 1) + r);
      }
    }
  });
}

function outlineNormals(skin) {
  const differs = (a, b) => Math.hypot(a[0] - b[0], a[1] - b[1]) > 1e-4;
  return skin.map((here, c) => {
    let [before, after] = [c, c];
    for (let i = 0; i < skin.length && !differs(skin[before], here); i++) {
      before = (before + skin.length - 1) % skin.length;
    }
    for (let i = 0; i < skin.length && !differs(skin[after], here); i++) {
      after = (after + 1) % skin.length;
    }
    const [x, y] = [skin[after][1] - skin[before][1], skin[before][0] - skin[after][0]];
    const length = Math.hypot(x, y) || 1;
    return [x / length, y / length];
  });
}

// The cut face between the skins at one end.
function addFace(made, columns, end, sign) {
  for (let c = 1; c < columns.length; c++) {
    const corners = [columns[c - 1].outer, columns[c].outer, columns[c].inner, columns[c - 1].inner].map(s => [s[end], s[0], s[1]]);
    const [u, v] = [minus(corners[2], corners[0]), minus(corners[3], corners[1])];
    const across = cross(u, v);
    const length = Math.hypot(...across);
    if (length < 1e-9) {
      continue;
    }
    const normal = across.map(n => n / length * (across[0] * sign < 0 ? -1 : 1));
    const first = made.points.length / 3;
    corners.forEach(p => { made.points.push(...p); made.normals.push(...normal); made.insides.push(0); });
    made.triangles.push(first, first + 1, first + 2, first, first + 2, first + 3);
  }
}

const minus = (a, b) => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
const dot = (a, b) => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
const cross = (a, b) => [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];

// The axis of a tube at a place: the point and the local axes, carried round the bends with the tube.
function axisAt(tube, along) {
  let piece = tube.pieces[0];
  for (const next of tube.pieces) {
    if (next.start <= along) { piece = next; }
  }
  const on = along - piece.start;
  if (!(piece.radius > 0)) {
    return { at: piece.at.map((n, k) => n + on * piece.x[k]), x: piece.x, y: piece.y, z: piece.z };
  }
  const [sin, cos] = [Math.sin(on / piece.radius), Math.cos(on / piece.radius)];
  const turned = v => {
    const [side, share] = [cross(piece.about, v), dot(piece.about, v)];
    return v.map((n, k) => cos * n + sin * side[k] + (1 - cos) * share * piece.about[k]);
  };
  const inwards = cross(piece.about, piece.x);
  const at = piece.at.map((n, k) => n + piece.radius * (sin * piece.x[k] + (1 - cos) * inwards[k]));
  return { at, x: turned(piece.x), y: turned(piece.y), z: turned(piece.z) };
}

// The axis of a tube as lines, two points each.
function axisLines(tube) {
  const steps = tube.pieces.length > 1 ? 48 : 1;
  const points = Array.from({ length: steps + 1 }, (_, i) => axisAt(tube, tube.length * i / steps).at);
  return points.slice(1).flatMap((point, i) => [...points[i], ...point]);
}

// How a place on a tube's axis moves in a case: six values; beyond its ends it moves with them as a rigid body.
function motionAt(tube, index, along) {
  const m = tube.motions[index];
  if (!m) {
    return [0, 0, 0, 0, 0, 0];
  }
  const last = tube.places.length - 1;
  const at = Math.min(Math.max(along, tube.places[0]), tube.places[last]);
  let low = 0;
  let high = last;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (tube.places[middle] <= at) { low = middle; } else { high = middle; }
  }
  const share = (at - tube.places[low]) / (tube.places[high] - tube.places[low] || 1);
  const motion = [];
  for (let k = 0; k < 6; k++) {
    motion.push(m[6 * low + k] + (m[6 * high + k] - m[6 * low + k]) * share);
  }
  const beyond = along - at;
  if (beyond !== 0) {
    const swing = cross(motion.slice(3), axisAt(tube, at).x.map(n => n * beyond));
    for (let k = 0; k < 3; k++) { motion[k] += swing[k]; }
  }
  return motion;
}

// Puts every vertex in its place, moved as the case says times the scale; fills shifts with how far each moves in truth, mm.
function placeFrame(mesh, caseIndex, scale, shifts) {
  for (const tube of mesh.tubes) {
    const known = new Map();
    for (let i = tube.first; i < tube.first + tube.count; i++) {
      const [s, a, b] = [mesh.local[3 * i], mesh.local[3 * i + 1], mesh.local[3 * i + 2]];
      let place = known.get(s);
      if (!place) {
        place = { axis: axisAt(tube, s), motion: motionAt(tube, caseIndex, s) };
        known.set(s, place);
      }
      const { axis, motion } = place;
      const arm = [0, 1, 2].map(k => a * axis.z[k] - b * axis.y[k]);
      const turned = cross(motion.slice(3), arm);
      for (let k = 0; k < 3; k++) {
        mesh.positions[3 * i + k] = axis.at[k] + arm[k] + scale * (motion[k] + turned[k]);
      }
      shifts[i] = Math.hypot(motion[0], motion[1], motion[2]);
    }
  }
}
