// Numbers in linear memory, by the address of an array and an index.

@inline export function f(p: usize, i: i32): f64 { return load<f64>(p + ((<usize>i) << 3)); }
@inline export function set(p: usize, i: i32, v: f64): void { store<f64>(p + ((<usize>i) << 3), v); }
@inline export function add(p: usize, i: i32, v: f64): void { const q = p + ((<usize>i) << 3); store<f64>(q, load<f64>(q) + v); }
@inline export function i32at(p: usize, i: i32): i32 { return load<i32>(p + ((<usize>i) << 2)); }
/**
 * Σ p·q over n numbers side by side, in two sums. Not by vectors: q was often written a moment ago, one
 * number at a time, and a wide read of narrow writes waits for them.
 */
@inline export function dot(p: usize, q: usize, n: i32): f64 {
  let even: f64 = 0;
  let odd: f64 = 0;
  const last = p + ((<usize>(n & ~1)) << 3);
  while (p < last) {
    even += load<f64>(p) * load<f64>(q);
    odd += load<f64>(p, 8) * load<f64>(q, 8);
    p += 16;
    q += 16;
  }
  if (n & 1) even += load<f64>(p) * load<f64>(q);
  return even + odd;
}
/** p −= l·q over n numbers side by side. */
@inline export function takeOff(p: usize, q: usize, l: f64, n: i32): void {
  const factor = f64x2.splat(l);
  const last = p + ((<usize>(n & ~1)) << 3);
  while (p < last) {
    v128.store(p, f64x2.sub(v128.load(p), f64x2.mul(factor, v128.load(q))));
    p += 16;
    q += 16;
  }
  if (n & 1) store<f64>(p, load<f64>(p) - l * load<f64>(q));
}
/** Address of number i. */
@inline export function place(p: usize, i: i32): usize { return p + ((<usize>i) << 3); }
@inline export function u8at(p: usize, i: i32): u32 { return <u32>load<u8>(p + <usize>i); }
@inline export function mark(p: usize, i: i32, v: u32): void { store<u8>(p + <usize>i, <u8>v); }
/** Copies bytes and numbers in small numbers, for which a bulk instruction's call costs more. */
@inline export function copyBytes(to: usize, from: usize, n: i32): void { for (let i = 0; i < n; i++) store<u8>(to + <usize>i, load<u8>(from + <usize>i)); }
@inline export function clearNumbers(p: usize, n: i32): void { for (let i = 0; i < n; i++) set(p, i, 0); }
@inline export function clearBytes(p: usize, n: i32): void { for (let i = 0; i < n; i++) store<u8>(p + <usize>i, 0); }
