"""The worked example of the first start: invented, and saying so in its own source line."""

from __future__ import annotations

from fourcount.record.outcome import EventsAndOthers, Outcome
from fourcount.record.paper import Record


def worked_example() -> Record:
    """A trial that never took place, with whole and unremarkable numbers."""
    return Record(
        title_text="Night lights on a rehabilitation ward",
        source_text="invented example · table 2",
        outcomes=(
            Outcome(
                name_text="Falls",
                table=EventsAndOthers(
                    first_left_text="38",
                    first_right_text="374",
                    second_left_text="70",
                    second_right_text="339",
                ),
                design="trial",
                first_label_text="Night lights",
                second_label_text="Usual care",
                left_heading_text="fell",
                right_heading_text="did not fall",
                left_words_text="fell at least once",
                right_words_text="did not fall",
                span_text="12 months",
                paper_text="0.54 (0.37 to 0.78)",
            ),
        ),
    )
