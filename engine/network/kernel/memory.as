// Numbers in linear memory, by the address of an array and an index.

@inline export function f(p: usize, i: i32): f64 { return load<f64>(p + ((<usize>i) << 3)); }
@inline export function set(p: usize, i: i32, v: f64): void { store<f64>(p + ((<usize>i) << 3), v); }
@inline export function add(p: usize, i: i32, v: f64): void { const q = p + ((<usize>i) << 3); store<f64>(q, load<f64>(q) + v); }
@inline export function i32at(p: usize, i: i32): i32 { return load<i32>(p + ((<usize>i) << 2)); }
@inline export function u8at(p: usize, i: i32): u32 { return <u32>load<u8>(p + <usize>i); }
@inline export function mark(p: usize, i: i32, v: u32): void { store<u8>(p + <usize>i, <u8>v); }
