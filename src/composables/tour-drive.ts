import { driver, type DriveStep } from 'driver.js';
import 'driver.js/dist/driver.css';
import '@/assets/tour.css';
import { TOUR_STEPS, type TourStep } from '@/composables/tour-steps';

/** A tour under way. */
export interface DrivenTour {
  /** Whether it was gone through to its end, once it is over. */
  readonly over: Promise<boolean>;
  readonly leave: () => void;
}

/** What is pointed out is no button of the tour's, as the library would have those who listen believe. */
const NOT_ITS_OWN = ['aria-haspopup', 'aria-expanded', 'aria-controls'];

/** The first place that can be seen; where none can, the step stands in the middle. */
function stepOf({ title, text, places }: TourStep): DriveStep {
  const element = places
    .map((selector) => document.querySelector(selector))
    .find((found) => found !== null && found.getClientRects().length > 0);
  return { ...(element ? { element } : {}), popover: { title, description: text } };
}

/**
 * Goes through the steps, over the page. Nothing moves by itself, and the keys stay in the step's box:
 * Tab, Enter, the arrows, and Escape, which leaves.
 * @param from the place of the step to begin at, 0 the first
 * @param told of each step that is reached
 */
export function driveTour(from: number, told: (step: number) => void): DrivenTour {
  let isThrough = false;
  let leave = (): void => undefined;
  const over = new Promise<boolean>((resolve) => {
    const tour = driver({
      ...{ animate: false, disableActiveInteraction: true, popoverClass: 'tour', showProgress: true },
      ...{ stagePadding: 4, stageRadius: 4, overlayOpacity: 0.45, overlayClickBehavior: () => undefined },
      ...{ nextBtnText: 'Next', prevBtnText: 'Back', doneBtnText: 'Done' },
      steps: TOUR_STEPS.map(stepOf),
      onPopoverRender: ({ wrapper, title, footer, closeButton, footerButtons }) => {
        wrapper.setAttribute('aria-modal', 'true');
        // Else the box would have the landmarks of a page.
        for (const part of [title, footer]) part.setAttribute('role', 'none');
        closeButton.textContent = 'Leave';
        closeButton.removeAttribute('aria-label');
        footerButtons.prepend(closeButton);
      },
      onHighlighted: (element, _step, { state }) => {
        NOT_ITS_OWN.forEach((name) => element?.removeAttribute(name));
        state.popover?.nextButton.focus();
        told(state.activeIndex ?? 0);
      },
      onDoneClick: () => {
        isThrough = true;
        leave();
      },
      onDestroyStarted: () => leave(),
    });
    leave = () => {
      tour.destroy();
      resolve(isThrough);
    };
    tour.drive(from);
  });
  return { over, leave };
}
