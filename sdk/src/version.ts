/** The SDK's own version, as in its package.json (a test holds them equal). */
export const SDK_VERSION = "0.1.0";
