/**
 * @typedef {object} Row
 * @property {string} what
 * @property {string} ours
 * @property {string} reference what it is held against, empty for none
 * @property {number | null} ratio ours over the reference
 * @property {string} goal as a sentence, empty for none
 * @property {boolean | null} isMet null where there is no goal
 */

/**
 * @param {number} value
 * @param {number} [digits]
 * @returns {string} with thin groups of three: 12,345
 */
export function count(value, digits = 0) {
  return value.toLocaleString('en-US', { maximumFractionDigits: digits, minimumFractionDigits: digits });
}

/** @param {number} bytes */
export function kilobytes(bytes) {
  return `${count(bytes / 1000, 1)} kB`;
}

/** @param {number} ms */
export function milliseconds(ms) {
  return `${count(ms, ms < 10 ? 1 : 0)} ms`;
}

/**
 * @param {readonly Row[]} rows
 * @param {string} machine
 * @returns {string} a table in Markdown, ready to be pasted
 */
export function markdown(rows, machine) {
  const cells = rows.map((row) => [
    row.what,
    row.ours,
    row.reference,
    row.ratio === null ? '' : row.ratio.toFixed(2),
    row.goal,
    row.isMet === null ? '' : row.isMet ? 'met' : 'missed',
  ]);
  const heads = ['Measure', 'Firstcold', 'Held against', 'Ratio', 'Goal', ''];
  const lines = [heads, heads.map(() => '---'), ...cells].map((line) => `| ${line.join(' | ')} |`);
  return [...lines, '', `Measured side by side in one run on: ${machine}.`].join('\n');
}
