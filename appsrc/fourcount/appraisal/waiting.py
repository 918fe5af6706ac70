"""Whether some findings are not whole yet."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap, OutcomeFindings


def waits(findings: OutcomeFindings) -> bool:
    """Whether a figure of these findings is computed apart and follows later."""
    parts: list[object] = [findings.test, getattr(findings.test, "p", None), findings.extras.fragility]
    for measure in findings.measures.values():
        parts.append(measure)
        if isinstance(measure, Figure):
            parts += [measure.estimate, measure.interval]
    return any(isinstance(part, Gap) and part.key == "follows" for part in parts)
