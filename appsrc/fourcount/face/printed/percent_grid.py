"""Under each percentage, the whole number of people that it stands for."""

from __future__ import annotations

from typing import TYPE_CHECKING

from fourcount.wording import labels, numbers

if TYPE_CHECKING:
    from fourcount.appraisal.findings import OutcomeFindings
    from fourcount.face.grid import Grid


def show_counts(grid: Grid, findings: OutcomeFindings | None) -> None:
    """Show the counts behind the percentages, as far as they are known."""
    for position in ("first", "second"):
        count = getattr(findings.totals, f"{position}_left") if findings else None
        words = "" if count is None else labels.HINTS["count_of_percent"].format(count=numbers.whole(count))
        grid.note(f"{position}_left_text").setText(words)
