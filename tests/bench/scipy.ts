export async function againstScipy(): Promise<void> {}
