"""All outcomes of a record as other programs read them, and as text."""

from __future__ import annotations

from fourcount.appraisal.appraise import appraise
from fourcount.publish.contract import FORMAT, contract
from fourcount.publish.listing import listing
from fourcount.record.entry.digits import plain
from fourcount.record.outcome import EffectOnly, Outcome
from fourcount.record.paper import Choices, Record


def file_json(record: Record) -> dict[str, object]:
    """What ``answer`` gives of one table, of every outcome of a record, each with its name."""
    choices = record.choices
    return {
        "format": FORMAT,
        "title": record.title_text,
        "source": record.source_text,
        "outcomes": [
            {
                "name": outcome.name_text,
                **contract(outcome, choices, appraise(outcome, choices)),
                **_checked(outcome, choices),
            }
            for outcome in record.outcomes
        ],
    }


def file_listing(record: Record) -> str:
    """The text of every outcome, each under its name."""
    choices = record.choices
    parts = []
    for place, outcome in enumerate(record.outcomes, start=1):
        name = plain(outcome.name_text)
        text = listing(outcome, appraise(outcome, choices), choices)
        parts.append(f"{place}. {name}\n\n{text}" if name or len(record.outcomes) > 1 else text)
    return "\n\n".join(parts)


def _checked(outcome: Outcome, choices: Choices) -> dict[str, object]:
    """What is said of a printed result beside counts; an effect alone has nothing to follow from."""
    if not plain(outcome.paper_text) or isinstance(outcome.table, EffectOnly):
        return {}
    from fourcount.appraisal.check import check
    from fourcount.publish.printed import printed

    return printed(check(outcome, choices))
