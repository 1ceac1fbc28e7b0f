/** The version that results carry; a test holds it to package.json. */
export const version = "0.1.0";
