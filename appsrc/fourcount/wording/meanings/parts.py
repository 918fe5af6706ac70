"""What several measures' sentences are put together from."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap, OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import limits, lines, names
from fourcount.wording.form import measure_of
from fourcount.wording.gaps import gap_text


def with_interval(key: str, figure: Figure, choices: Choices, per: int = 1) -> str:
    """A figure's interval behind its estimate: " (95% interval 3.3 to 12.4)", or "" where there is none."""
    if isinstance(figure.interval, Gap):
        return ""
    return f" ({limits.interval_name(choices.level)} {lines.interval_text(key, figure, per)})"


def no_interval(figure: Figure) -> str:
    """Why there is no interval, as a sentence of its own behind the others; "" where there is one."""
    return f" {gap_text(figure.interval)}" if isinstance(figure.interval, Gap) else ""


def given_estimate(figure: Figure) -> float:
    """The estimate of a figure that is known to have one."""
    if isinstance(figure.estimate, Gap):
        raise TypeError(figure.estimate.key)
    return figure.estimate


def estimate_of(key: str, findings: OutcomeFindings) -> float:
    """The estimate of another measure, where this one cannot be without it."""
    figure = measure_of(key, findings)
    if not isinstance(figure, Figure):
        raise TypeError(key)
    return given_estimate(figure)


def times(name: str, outcome: Outcome, ratio: str) -> str:
    """``The risk with night lights was 0.54 times that with usual care``."""
    index, reference = names.in_group(outcome, "index"), names.in_group(outcome, "reference")
    return f"The {name} {index} was {ratio} times that {reference}"


def spanned(words: str, outcome: Outcome) -> str:
    """The event with the time in which it counts."""
    span = names.within_span(outcome)
    return f"{words} {span}" if span else words
