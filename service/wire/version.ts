/** The version of the service, as package.json has it (a test keeps the two alike). */
export const VERSION = "0.1.0";
