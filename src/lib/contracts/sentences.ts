/** Said by the server, and by the browser before it sends what the server would refuse. */
export const fileTooLarge = (mostBytes: number): string =>
  `The file is larger than ${Math.floor(mostBytes / 1024 / 1024)}\u00A0MB. Save the page on its own, or at a lower resolution.`;
