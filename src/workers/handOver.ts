import { move, transferableSymbol, valueSymbol } from 'piscina';

/** Answers with a value whose bytes go to the thread that asked without a copy. */
export function handOver<T>(value: T, bytes: readonly Uint8Array[]): T {
  return move({
    [transferableSymbol]: bytes.map(({ buffer }) => buffer),
    [valueSymbol]: value,
  } as never) as unknown as T;
}

/** Bytes in a buffer of their own, as only such can be handed over. */
export function ownBuffer(bytes: Uint8Array): Uint8Array {
  const whole = bytes.byteOffset === 0 && bytes.byteLength === bytes.buffer.byteLength;
  return whole ? bytes : Uint8Array.from(bytes);
}
