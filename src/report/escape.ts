/** Text from the study inside HTML or SVG, in content and in attributes. Control characters have no place in either. */
export function escapeHtml(text: string): string {
  return withoutControls(text).replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);
}

/** Without the characters that steer a terminal or end a page; tabs and line ends become spaces. */
export function withoutControls(text: string): string {
  return text.replace(/[\t\n\r]/g, " ").replace(/\p{Cc}/gu, "");
}

/** A CSS string: everything but plain letters, digits and a few signs is written as its code. */
export function cssString(text: string): string {
  const inside = [...withoutControls(text)].map((sign) =>
    /[A-Za-z0-9 .,()-]/.test(sign) ? sign : `\\${(sign.codePointAt(0) ?? 0).toString(16)} `,
  );
  return `"${inside.join("")}"`;
}
