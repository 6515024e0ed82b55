/** The oldest Node.js that everything here runs on. */
export const oldestNode = '20.19.0';

/** Why `version` (such as "20.20.2") is too old, in one line; null when it is not. */
export function nodeVersionFault(version) {
  const [major = 0, minor = 0] = version.split('.').map(Number);
  const [leastMajor, leastMinor] = oldestNode.split('.').map(Number);
  const fits = major > leastMajor || (major === leastMajor && minor >= leastMinor);
  return fits
    ? null
    : `Ratewell needs Node.js ${oldestNode} or newer, and this is ${version}. Install Node.js 20.`;
}
