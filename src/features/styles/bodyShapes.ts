import type { Region, Species } from '#shared/grooming/types.ts';

/** One region of the drawing: the side towards us, and what is seen of the other side behind it. */
export interface BodyShape {
  near: string;
  far?: string;
  /** Where the leader line touches, and where a number stands on a small drawing. */
  spot: readonly [number, number];
  /** Where the label stands: the start, middle or end of its text. */
  label: { at: readonly [number, number]; anchor: 'start' | 'middle' | 'end' };
}

export interface BodyDrawing {
  /** From the one behind to the one in front. */
  order: readonly Region[];
  shapes: Record<Region, BodyShape>;
  eye: readonly [number, number];
  nose: string;
  lines: readonly string[];
}

/** The way a hand goes over the pet, for arrow keys and tables. */
export const regionOrder: readonly Region[] = [
  'head',
  'ears',
  'neck',
  'back',
  'belly',
  'foreLegs',
  'hindLegs',
  'feet',
  'tail',
  'sanitary',
];

/** Our own drawings, seen from the right side, on a ground at y = 288. */
export const bodyDrawings: Record<Species, BodyDrawing> = {
  dog: {
    order: [
      'tail',
      'belly',
      'back',
      'foreLegs',
      'hindLegs',
      'feet',
      'neck',
      'head',
      'ears',
      'sanitary',
    ],
    eye: [391, 69],
    nose: 'M435 77C442 74 450 78 450 85C450 92 441 95 436 90C432 86 431 80 435 77Z',
    lines: ['M442 92C440 101 428 106 414 105'],
    shapes: {
      head: {
        near: 'M331 74C332 46 352 32 376 35C395 38 404 50 410 64C424 67 440 70 447 78C452 90 449 104 436 110C414 118 392 122 372 118C348 114 331 98 331 74Z',
        spot: [400, 92],
        label: { at: [466, 44], anchor: 'start' },
      },
      ears: {
        near: 'M340 44C352 38 366 46 368 62C371 86 364 112 349 122C333 120 324 100 325 76C326 60 331 48 340 44Z',
        spot: [347, 82],
        label: { at: [340, -14], anchor: 'middle' },
      },
      neck: {
        near: 'M290 106C302 92 316 76 331 60L376 116C354 132 332 150 318 172L296 160Z',
        spot: [326, 122],
        label: { at: [466, 146], anchor: 'start' },
      },
      back: {
        near: 'M116 130C122 112 142 105 168 104C210 102 256 108 290 106L318 172C250 176 180 174 112 168C108 152 110 140 116 130Z',
        spot: [206, 138],
        label: { at: [190, 36], anchor: 'middle' },
      },
      belly: {
        near: 'M112 166C180 172 250 174 318 170C320 190 306 208 284 212C244 218 204 202 172 198C150 196 126 198 117 190C113 184 112 174 112 166Z',
        spot: [222, 190],
        label: { at: [222, 326], anchor: 'middle' },
      },
      foreLegs: {
        near: 'M266 160C280 146 310 150 316 174C320 202 310 232 308 272L274 272C274 238 264 206 261 184C260 174 261 166 266 160Z',
        far: 'M302 184C318 178 334 186 336 200C338 226 334 244 333 268L306 268Z',
        spot: [290, 214],
        label: { at: [466, 224], anchor: 'start' },
      },
      hindLegs: {
        near: 'M112 138C132 126 170 132 178 162C184 186 173 206 165 222C159 236 161 252 162 272L127 272C129 252 128 240 120 224C107 200 98 166 112 138Z',
        far: 'M164 190C186 190 200 208 196 228C190 244 190 254 190 268L164 268Z',
        spot: [142, 196],
        label: { at: [94, 236], anchor: 'end' },
      },
      feet: {
        near: 'M126 268H163C173 270 180 278 180 288H122C117 281 119 272 126 268ZM273 268H309C319 270 326 278 326 288H269C264 281 266 272 273 268Z',
        far: 'M176 264H191C200 266 206 274 206 284H184ZM316 264H334C343 266 349 274 349 284H328Z',
        spot: [300, 279],
        label: { at: [466, 302], anchor: 'start' },
      },
      tail: {
        near: 'M134 116C112 108 90 88 84 56C84 46 95 43 101 52C111 74 126 92 148 104C148 110 142 114 134 116Z',
        spot: [98, 76],
        label: { at: [62, 40], anchor: 'end' },
      },
      sanitary: {
        near: 'M112 140C98 146 92 166 98 186C106 194 118 188 121 174C122 158 119 148 112 140Z',
        spot: [107, 168],
        label: { at: [70, 140], anchor: 'end' },
      },
    },
  },
  cat: {
    order: [
      'tail',
      'belly',
      'back',
      'foreLegs',
      'hindLegs',
      'feet',
      'neck',
      'ears',
      'head',
      'sanitary',
    ],
    eye: [388, 84],
    nose: 'M410 94C414 92 418 93 418 96C417 100 412 101 409 99C408 97 408 95 410 94Z',
    lines: [
      'M412 101C409 108 402 110 395 108',
      'M398 100L362 94M398 104L362 106',
      'M336 62C344 56 352 53 360 52',
    ],
    shapes: {
      head: {
        near: 'M322 92C320 64 342 46 368 48C392 50 408 66 410 84C416 88 421 94 418 102C413 120 392 132 368 132C342 132 324 116 322 92Z',
        spot: [348, 96],
        label: { at: [466, 70], anchor: 'start' },
      },
      ears: {
        near: 'M328 80C322 62 322 40 330 22C346 30 358 42 366 56C350 56 338 66 328 80ZM376 54C384 42 394 32 408 26C414 42 412 62 406 76C398 64 388 58 376 54Z',
        spot: [396, 44],
        label: { at: [340, -14], anchor: 'middle' },
      },
      neck: {
        near: 'M284 120C296 104 310 96 323 86L368 131C346 138 328 152 314 176L292 164Z',
        spot: [318, 134],
        label: { at: [466, 150], anchor: 'start' },
      },
      back: {
        near: 'M124 144C130 126 158 116 190 116C228 116 258 124 284 120L314 176C250 180 180 180 120 174C117 162 119 152 124 144Z',
        spot: [206, 148],
        label: { at: [190, 36], anchor: 'middle' },
      },
      belly: {
        near: 'M120 172C180 178 250 178 314 174C314 196 298 212 272 214C236 218 204 212 174 208C148 206 126 204 121 192C118 186 119 178 120 172Z',
        spot: [218, 196],
        label: { at: [222, 326], anchor: 'middle' },
      },
      foreLegs: {
        near: 'M268 172C284 160 306 166 310 186C312 210 303 238 302 274L274 274C274 242 265 212 263 192C262 184 263 178 268 172Z',
        far: 'M300 190C314 186 328 194 329 206C330 230 326 248 326 270L302 270Z',
        spot: [288, 224],
        label: { at: [466, 228], anchor: 'start' },
      },
      hindLegs: {
        near: 'M120 152C142 140 176 148 182 174C187 196 176 212 167 226C160 238 161 254 162 274L133 274C133 254 131 240 125 226C114 202 108 170 120 152Z',
        far: 'M166 200C188 200 200 212 196 232C190 246 190 256 190 270L166 270Z',
        spot: [148, 202],
        label: { at: [94, 236], anchor: 'end' },
      },
      feet: {
        near: 'M133 270H163C174 271 180 279 180 288H128C124 281 126 273 133 270ZM274 270H303C314 271 320 279 320 288H269C265 281 267 273 274 270Z',
        far: 'M176 266H191C201 267 206 275 206 284H184ZM310 266H327C337 267 342 275 342 284H322Z',
        spot: [296, 280],
        label: { at: [466, 302], anchor: 'start' },
      },
      tail: {
        near: 'M140 148C112 146 92 122 92 88C92 64 84 48 70 38C62 30 69 18 82 24C106 36 114 60 113 86C113 108 126 124 150 126C154 136 150 146 140 148Z',
        spot: [100, 84],
        label: { at: [48, 96], anchor: 'end' },
      },
      sanitary: {
        near: 'M119 152C105 158 100 176 105 194C113 201 124 196 127 182C128 168 126 160 119 152Z',
        spot: [114, 177],
        label: { at: [76, 172], anchor: 'end' },
      },
    },
  },
};
