"""The worked example of the first start: invented, and saying so in its own source line."""

from __future__ import annotations

from fourcount.record.outcome import EventsAndOthers, Outcome
from fourcount.record.paper import Record


def worked_example() -> Record:
    """A trial that never took place, with whole and unremarkable numbers: a benefit, and a harm beside it."""
    return Record(
        title_text="Night lights on a rehabilitation ward",
        source_text="invented example · table 2",
        outcomes=(_falls(), _sleep()),
    )


def _falls() -> Outcome:
    return Outcome(
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
        plain_event_text="fall at least once",
        plain_other_text="do not fall",
    )


def _sleep() -> Outcome:
    return Outcome(
        name_text="Poor sleep",
        table=EventsAndOthers(
            first_left_text="62",
            first_right_text="350",
            second_left_text="49",
            second_right_text="360",
        ),
        design="trial",
        first_label_text="Night lights",
        second_label_text="Usual care",
        left_heading_text="slept badly",
        right_heading_text="did not sleep badly",
        left_words_text="slept badly on most nights",
        right_words_text="did not sleep badly on most nights",
        span_text="12 months",
        paper_text="1.26 (0.89 to 1.78)",
        plain_event_text="sleep badly on most nights",
        plain_other_text="do not sleep badly on most nights",
    )
