'use client'

import { Dialog } from '@/components/ui/dialog'
import type { Issue } from '@/scene/session/judge'

/** What is wrong with a file that was brought in: every path, what was understood and what would be right. */
export function FileDialog({ name, issues, onClose }: { name: string; issues: Issue[]; onClose(): void }) {
  return (
    <Dialog
      title="This file was not taken"
      wide
      about={{ k: 'File', v: name }}
      onClose={onClose}
      actions={
        <button type="button" className="btn pri" onClick={onClose}>
          Keep the drawing
        </button>
      }
    >
      <p>
        The drawing is as it was. {issues.length === 1 ? 'One thing is' : `${issues.length} things are`} to be
        mended in the file.
      </p>
      <div className="issue-list" tabIndex={0} role="region" aria-label="What is wrong">
        <table className="tab">
          <thead>
            <tr>
              <th scope="col">Where</th>
              <th scope="col">What is wrong, and what would be right</th>
            </tr>
          </thead>
          <tbody>
            {issues.slice(0, 100).map((issue) => (
              <tr key={`${issue.path}-${issue.code}`}>
                <th scope="row" className="fig">
                  {issue.path || 'whole file'}
                </th>
                <td>
                  {issue.message} {issue.fix}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </Dialog>
  )
}
