import type { Deps } from '../../deps';

export async function seedDemo(_deps: Deps): Promise<void> {}
