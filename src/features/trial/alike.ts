/** Figures worked out by another build of the language may differ in their last digits, and in nothing else. */
const relative = 1e-9;

/** Whether two values, as JSON, say the same: all but numbers exactly, numbers to nine digits. */
export function isAlike(one: unknown, other: unknown): boolean {
  if (typeof one === 'number' && typeof other === 'number') {
    return Math.abs(one - other) <= relative * Math.max(1, Math.abs(one), Math.abs(other));
  }
  if (typeof one !== 'object' || typeof other !== 'object' || one === null || other === null) {
    return one === other;
  }
  if (Array.isArray(one) !== Array.isArray(other)) return false;
  const [left, right] = [Object.entries(one), new Map(Object.entries(other))];
  return left.length === right.size && left.every(([key, value]) => isAlike(value, right.get(key)));
}
