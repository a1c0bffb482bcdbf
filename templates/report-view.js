// The picture: a parallel projection that turns about the frame's middle, drawn by WebGL 2 when something has changed.

const SURFACE = [`#version 300 es
  uniform mat4 view; uniform vec3 light; uniform vec3 towards;
  in vec3 position; in vec3 normal; in vec4 colour;
  out vec3 shade;
  void main() {
    gl_Position = view * vec4(position, 1.0);
    vec3 n = dot(normal, towards) < 0.0 ? -normal : normal;
    shade = colour.rgb * (0.5 + 0.5 * max(dot(n, light), 0.0)) * (1.0 - 0.45 * colour.a);
  }`, `#version 300 es
  precision mediump float;
  in vec3 shade; out vec4 pixel;
  void main() { pixel = vec4(shade, 1.0); }`];

const LINES = [`#version 300 es
  uniform mat4 view; uniform float nearer;
  in vec3 position;
  void main() { gl_Position = view * vec4(position, 1.0); gl_Position.z -= nearer; }`, `#version 300 es
  precision mediump float;
  uniform vec3 ink; out vec4 pixel;
  void main() { pixel = vec4(ink, 1.0); }`];

class FrameView {
  constructor(canvas, mesh, home, changed) {
    this.canvas = canvas;
    this.mesh = mesh;
    this.home = home;
    this.changed = changed;
    this.gl = canvas.getContext("webgl2", { antialias: true, alpha: true, premultipliedAlpha: true });
    if (!this.gl) {
      throw new Error("no WebGL 2");
    }
    const gl = this.gl;
    this.surface = this.program(SURFACE);
    this.lines = this.program(LINES);
    this.buffers = {};
    for (const name of ["positions", "normals", "colours", "ghost"]) { this.buffers[name] = gl.createBuffer(); }
    this.fill(gl.ARRAY_BUFFER, "normals", mesh.normals);
    this.buffers.triangles = gl.createBuffer();
    this.fill(gl.ELEMENT_ARRAY_BUFFER, "triangles", mesh.triangles);
    this.buffers.edges = gl.createBuffer();
    this.fill(gl.ELEMENT_ARRAY_BUFFER, "edges", mesh.edges);
    this.ghostCount = 0;
    this.turnTo(...home);
    new ResizeObserver(() => this.resized()).observe(canvas);
  }

  program(sources) {
    const gl = this.gl;
    const program = gl.createProgram();
    [gl.VERTEX_SHADER, gl.FRAGMENT_SHADER].forEach((kind, i) => {
      const shader = gl.createShader(kind);
      gl.shaderSource(shader, sources[i].trim());
      gl.compileShader(shader);
      gl.attachShader(program, shader);
    });
    gl.linkProgram(program);
    if (!gl.getProgramParameter(program, gl.LINK_STATUS)) {
      throw new Error(gl.getProgramInfoLog(program) || "shader");
    }
    return program;
  }

  fill(target, name, data) {
    this.gl.bindBuffer(target, this.buffers[name]);
    this.gl.bufferData(target, data, this.gl.DYNAMIC_DRAW);
  }

  setPlaces() { this.fill(this.gl.ARRAY_BUFFER, "positions", this.mesh.positions); this.redraw(); }

  setColours(colours) { this.fill(this.gl.ARRAY_BUFFER, "colours", colours); this.redraw(); }

  // Pairs of points: the frame as it was before it moved.
  setGhost(points) { this.fill(this.gl.ARRAY_BUFFER, "ghost", points); this.ghostCount = points.length / 3; this.redraw(); }

  setInks(sheet, edge, ghost) { Object.assign(this, { sheet, edge, ghost }); this.redraw(); }

  turnTo(azimuth, elevation) {
    this.azimuth = azimuth;
    this.elevation = Math.max(-90, Math.min(90, elevation));
    const [a, e] = [this.azimuth * Math.PI / 180, this.elevation * Math.PI / 180];
    this.towards = [Math.cos(e) * Math.cos(a), Math.cos(e) * Math.sin(a), Math.sin(e)];
    this.right = [-Math.sin(a), Math.cos(a), 0];
    this.up = cross(this.towards, this.right);
    this.redraw();
  }

  turn(azimuth, elevation) { this.turnTo(this.azimuth + azimuth, this.elevation + elevation); }

  move(dx, dy) {
    for (let k = 0; k < 3; k++) { this.centre[k] += (dy * this.up[k] - dx * this.right[k]) / this.scale; }
    this.redraw();
  }

  // Zooms about a point of the canvas.
  zoom(factor, x, y) {
    const scale = Math.max(this.fitted / 5, Math.min(this.fitted * 200, this.scale * factor));
    const [dx, dy] = [x - this.width / 2, y - this.height / 2];
    const by = 1 / this.scale - 1 / scale;
    for (let k = 0; k < 3; k++) { this.centre[k] += (dx * this.right[k] - dy * this.up[k]) * by; }
    this.scale = scale;
    this.redraw();
  }

  fit() {
    const p = this.mesh.positions;
    const low = [Infinity, Infinity, Infinity];
    const high = [-Infinity, -Infinity, -Infinity];
    const axes = [this.right, this.up, this.towards];
    for (let i = 0; i < p.length; i += 3) {
      for (let k = 0; k < 3; k++) {
        const v = p[i] * axes[k][0] + p[i + 1] * axes[k][1] + p[i + 2] * axes[k][2];
        low[k] = Math.min(low[k], v);
        high[k] = Math.max(high[k], v);
      }
    }
    this.centre = [0, 1, 2].map(k => axes.reduce((sum, axis, i) => sum + axis[k] * (low[i] + high[i]) / 2, 0));
    this.reach = Math.hypot(high[0] - low[0], high[1] - low[1], high[2] - low[2]) || 1;
    this.measure();
    this.fitted = 0.86 * Math.min(this.width / (high[0] - low[0] || 1), this.height / (high[1] - low[1] || 1));
    this.scale = this.fitted;
    this.isFitted = true;
    this.redraw();
  }

  measure() {
    this.width = Math.max(1, this.canvas.clientWidth);
    this.height = Math.max(1, this.canvas.clientHeight);
  }

  resized() {
    const before = this.width;
    this.measure();
    if (this.centre && before !== this.width) { this.fit(); } else { this.redraw(); }
  }

  // Where a point of the frame stands on the canvas; the third is how near it is.
  place(point) {
    const d = minus(point, this.centre);
    return [this.width / 2 + this.scale * dot(d, this.right), this.height / 2 - this.scale * dot(d, this.up), dot(d, this.towards)];
  }

  // The tube in front at a place of the canvas, or -1.
  pick(x, y) {
    const { positions, triangles, owner } = this.mesh;
    const count = positions.length / 3;
    const seen = new Float64Array(3 * count);
    for (let i = 0; i < count; i++) {
      const [sx, sy, depth] = this.place([positions[3 * i], positions[3 * i + 1], positions[3 * i + 2]]);
      seen[3 * i] = sx - x;
      seen[3 * i + 1] = sy - y;
      seen[3 * i + 2] = depth;
    }
    let [best, nearest] = [-1, -Infinity];
    for (let i = 0; i < triangles.length; i += 3) {
      const [a, b, c] = [3 * triangles[i], 3 * triangles[i + 1], 3 * triangles[i + 2]];
      const u = seen[b] * seen[c + 1] - seen[c] * seen[b + 1];
      const v = seen[c] * seen[a + 1] - seen[a] * seen[c + 1];
      const w = seen[a] * seen[b + 1] - seen[b] * seen[a + 1];
      const area = u + v + w;
      if (area !== 0 && (u >= 0) === (area > 0) && (v >= 0) === (area > 0) && (w >= 0) === (area > 0)) {
        const depth = (u * seen[a + 2] + v * seen[b + 2] + w * seen[c + 2]) / area;
        if (depth > nearest) { [best, nearest] = [owner[triangles[i]], depth]; }
      }
    }
    return best;
  }

  redraw() {
    if (!this.waiting && this.centre) {
      this.waiting = true;
      requestAnimationFrame(() => { this.waiting = false; this.draw(); });
    }
  }

  draw() {
    const gl = this.gl;
    const ratio = Math.min(3, window.devicePixelRatio || 1);
    const [w, h] = [Math.round(this.width * ratio), Math.round(this.height * ratio)];
    if (this.canvas.width !== w || this.canvas.height !== h) { [this.canvas.width, this.canvas.height] = [w, h]; }
    gl.viewport(0, 0, w, h);
    gl.clearColor(0, 0, 0, 0);
    gl.clear(gl.COLOR_BUFFER_BIT | gl.DEPTH_BUFFER_BIT);
    gl.enable(gl.DEPTH_TEST);
    const view = this.matrix();

    gl.useProgram(this.surface);
    gl.uniformMatrix4fv(gl.getUniformLocation(this.surface, "view"), false, view);
    const light = [0, 1, 2].map(k => -0.35 * this.right[k] + 0.5 * this.up[k] + 0.79 * this.towards[k]);
    gl.uniform3fv(gl.getUniformLocation(this.surface, "light"), light);
    gl.uniform3fv(gl.getUniformLocation(this.surface, "towards"), this.towards);
    this.attribute(this.surface, "position", "positions", 3, gl.FLOAT, false);
    this.attribute(this.surface, "normal", "normals", 3, gl.FLOAT, false);
    this.attribute(this.surface, "colour", "colours", 4, gl.UNSIGNED_BYTE, true);
    gl.enable(gl.POLYGON_OFFSET_FILL);
    gl.polygonOffset(1, 1);
    gl.bindBuffer(gl.ELEMENT_ARRAY_BUFFER, this.buffers.triangles);
    gl.drawElements(gl.TRIANGLES, this.mesh.triangles.length, gl.UNSIGNED_INT, 0);
    gl.disable(gl.POLYGON_OFFSET_FILL);

    gl.useProgram(this.lines);
    gl.uniformMatrix4fv(gl.getUniformLocation(this.lines, "view"), false, view);
    gl.uniform3fv(gl.getUniformLocation(this.lines, "ink"), this.edge);
    gl.uniform1f(gl.getUniformLocation(this.lines, "nearer"), 0.0004);
    this.attribute(this.lines, "position", "positions", 3, gl.FLOAT, false);
    gl.bindBuffer(gl.ELEMENT_ARRAY_BUFFER, this.buffers.edges);
    gl.drawElements(gl.LINES, this.mesh.edges.length, gl.UNSIGNED_INT, 0);
    if (this.ghostCount > 0) {
      gl.uniform3fv(gl.getUniformLocation(this.lines, "ink"), this.ghost);
      this.attribute(this.lines, "position", "ghost", 3, gl.FLOAT, false);
      gl.drawArrays(gl.LINES, 0, this.ghostCount);
    }
    this.changed();
  }

  attribute(program, name, buffer, size, type, isShare) {
    const gl = this.gl;
    const at = gl.getAttribLocation(program, name);
    gl.bindBuffer(gl.ARRAY_BUFFER, this.buffers[buffer]);
    gl.enableVertexAttribArray(at);
    gl.vertexAttribPointer(at, size, type, isShare, 0, 0);
  }

  matrix() {
    const [sx, sy, sz] = [2 * this.scale / this.width, 2 * this.scale / this.height, -1 / this.reach];
    const rows = [this.right.map(n => n * sx), this.up.map(n => n * sy), this.towards.map(n => n * sz)];
    const m = new Float32Array(16);
    rows.forEach((row, r) => {
      for (let k = 0; k < 3; k++) { m[4 * k + r] = row[k]; }
      m[12 + r] = -dot(row, this.centre);
    });
    m[15] = 1;
    return m;
  }
}
