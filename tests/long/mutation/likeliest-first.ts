import { relative } from 'node:path';
import type { TestSpecification } from 'vitest/node';
import { BaseSequencer } from 'vitest/node';

/** A mutant is often caught by the file that caught its neighbour; where none did, by a quick file as well as a slow. */
export class LikeliestFirst extends BaseSequencer {
  override async sort(files: TestSpecification[]): Promise<TestSpecification[]> {
    const last = new Map(files.map((file) => [file, this.#lastRun(file)]));
    return [...files].sort((one, other) => {
      const [a, b] = [last.get(one)!, last.get(other)!];
      return Number(b.failed) - Number(a.failed) || a.duration - b.duration;
    });
  }

  #lastRun(file: TestSpecification): { failed: boolean; duration: number } {
    const path = relative(this.ctx.config.root, file.moduleId);
    const known = this.ctx.cache.getFileTestResults(`${file.project.name}:${path}`);
    return known ?? { failed: false, duration: 0 };
  }
}
