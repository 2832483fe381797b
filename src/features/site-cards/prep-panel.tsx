import type { Course } from '../../../shared/domain/build-up.ts'

/** Preparing and grinding: method, profile, and the dust that comes with them. */
export function PrepPanel({ course }: { course: Course }) {
  const { preparation } = course
  return (
    <section aria-label="Preparation" className="grid gap-2">
      {preparation ? (
        <p>
          <span className="block text-body">Method</span>
          <strong>{preparation.method}</strong>
          <span className="mt-2 block text-body">Profile</span>
          <strong className="text-site-figure">{preparation.profile === undefined ? 'not stated' : `CSP ${preparation.profile}`}</strong>
          <span className="block text-body">Compare with the profile chips in hand, edges too.</span>
        </p>
      ) : (
        <p>No mix and no preparation are given for this course. Call the office.</p>
      )}
    </section>
  )
}
