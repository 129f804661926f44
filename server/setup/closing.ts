/** What has to be undone at the end, in reverse order. */
export interface Closing {
  add(step: () => unknown): void;
  /** Undoes everything once, whatever fails on the way. */
  run(onFailure: (error: unknown) => void): Promise<void>;
}

export function createClosing(): Closing {
  const steps: (() => unknown)[] = [];
  return {
    add: (step) => steps.push(step),
    run: async (onFailure) => {
      for (let step = steps.pop(); step; step = steps.pop()) {
        try {
          await step();
        } catch (error) {
          onFailure(error);
        }
      }
    },
  };
}
