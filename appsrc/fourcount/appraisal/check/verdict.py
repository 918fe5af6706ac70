"""From the matches of one printed figure to what is said of it, in the order in which it is said."""

from __future__ import annotations

from collections.abc import Iterable, Iterator

from fourcount.appraisal.check.candidate import Candidate, Way
from fourcount.appraisal.check.digits import last_digits, transposed
from fourcount.appraisal.check.misses import Miss, near_miss
from fourcount.appraisal.check.search import OTHER_ANALYSES, Hit, has_limits, hit, nearest_way, wanted_level
from fourcount.appraisal.check.symmetry import Triple, mirrored_limit, ordered, slips, symmetric, triple_of
from fourcount.appraisal.findings.check import Finding
from fourcount.record.entry.readings import PrintedFigure
from fourcount.stats.results import Fact

Facts = dict[str, Fact]

WHOLE = ("reproduced", "other-name", "other-way-round", "other-name-and-way")
ESTIMATE = ("estimate-only", "estimate-other-name", "estimate-other-way", "estimate-other-name-and-way")
_MOST_OTHERS = 3
_FEW_UNITS = 20


def effect_findings(
    figure: PrintedFigure, hits: tuple[Hit, ...], candidates: tuple[Candidate, ...], *, heavy: bool
) -> tuple[Finding, ...]:
    """What the counts say of the estimate and its limits, then what the limits say of themselves."""
    found = tuple(_from_counts(figure, hits, candidates, heavy=heavy))
    whole = bool(hits) and hits[0].match.fit == "all"
    told = whole or any(finding.key in ("one-limit", "interval-only", "cut-off", "last-digit") for finding in found)
    symmetry = () if told else symmetry_findings(figure, alone=not candidates)
    last = found[-1:] if found and found[-1].key in ("nearest", "adjusted") else ()
    return found[: len(found) - len(last)] + symmetry + last


def symmetry_findings(figure: PrintedFigure, *, alone: bool) -> tuple[Finding, ...]:
    """Limits that do not lie evenly; ``alone`` also says where they do, when there is nothing else to go by."""
    triple = triple_of(figure)
    if triple is None:
        return ()
    if not ordered(triple):
        return (Finding(key="limits-disordered"),)
    if symmetric(triple):
        return (Finding(key="symmetric", facts=_scale(triple), agrees=True),) if alone else ()
    facts = _scale(triple)
    for side, given in (("low", "high"), ("high", "low")):
        mirrored = mirrored_limit(triple, given)  # type: ignore[arg-type]
        if mirrored is not None:
            facts[f"mirrored_{side}"] = mirrored
    for part, number in slips(triple):
        facts[f"slip_{part}"] = number.text
    return (Finding(key="not-symmetric", facts=facts),)


def _scale(triple: Triple) -> Facts:
    return {"log_scale": int(triple.log_scale)}


def _from_counts(
    figure: PrintedFigure, hits: tuple[Hit, ...], candidates: tuple[Candidate, ...], *, heavy: bool
) -> Iterator[Finding]:
    if not candidates:
        return
    if not hits:
        yield from _nothing_fits(figure, candidates, heavy=heavy)
    elif hits[0].match.fit == "all" or (hits[0].match.fit == "interval" and figure.estimate is None):
        yield from _whole(figure, hits, candidates)
    elif hits[0].match.fit == "interval":
        yield _near(figure, candidates, heavy=heavy) or _interval_only(figure, hits)
    else:
        yield from _estimate_alone(figure, hits, candidates, heavy=heavy)
    if figure.measure == "hazard_ratio":
        yield Finding(key="no-hazard-ratio")


def _whole(figure: PrintedFigure, hits: tuple[Hit, ...], candidates: tuple[Candidate, ...]) -> Iterator[Finding]:
    top, *rest = _groups(hits)
    first = top[0]
    facts = {**_facts(first, _methods(top)), **_own(figure, first, candidates), "coarse": int(_coarse(figure))}
    if figure.adjusted and first.at_level and first.place == 0:
        yield Finding(key="adjusted-is-crude", facts=facts)
        return
    if first.at_level:
        key = "other-analysis" if _otherwise(first) else WHOLE[first.place]
        yield Finding(key=key, facts=facts, agrees=first.place == 0)
    else:
        printed: Facts = {} if figure.level is None else {"printed_level": figure.level}
        yield Finding(key="other-level", facts={**facts, **printed, "place": first.place})
    if first.place or not first.at_level:
        whole = [group for group in rest if group[0].rank[0] <= 1]
        for group in whole[:_MOST_OTHERS]:
            yield Finding(key="also-fits", facts=_facts(group[0], _methods(group)))


def _estimate_alone(
    figure: PrintedFigure, hits: tuple[Hit, ...], candidates: tuple[Candidate, ...], *, heavy: bool
) -> Iterator[Finding]:
    first = hits[0]
    if figure.adjusted:
        yield Finding(key="adjusted", facts=_facts(first, ""), agrees=True)
        return
    miss = near_miss(figure, first.candidate, heavy=heavy)
    if miss is not None and first.place == 0:
        yield _missed(figure, first.candidate, miss)
        return
    facts = {**_facts(first, first.match.method), **_own(figure, first, candidates)}
    yield Finding(key="estimate-other-analysis" if _otherwise(first) else ESTIMATE[first.place], facts=facts)


def _nothing_fits(figure: PrintedFigure, candidates: tuple[Candidate, ...], *, heavy: bool) -> Iterator[Finding]:
    nearest = _nearest(figure, candidates)
    if figure.adjusted:
        yield Finding(key="adjusted", facts=_facts(nearest, ""), agrees=True)
        return
    near = _near(figure, candidates, heavy=heavy)
    yield near or Finding(key="nearest", facts=_facts(nearest, nearest.match.method))


def _near(figure: PrintedFigure, candidates: tuple[Candidate, ...], *, heavy: bool) -> Finding | None:
    """A near miss of the print's own measure as read, where no estimate fits."""
    for candidate in candidates:
        if candidate.heavy or not candidate.named or candidate.orientation != "as-read":
            continue
        miss = near_miss(figure, candidate, heavy=heavy)
        if miss is not None:
            return _missed(figure, candidate, miss)
    return None


def _interval_only(figure: PrintedFigure, hits: tuple[Hit, ...]) -> Finding:
    top = next(_groups(hits))
    estimate = top[0].match.computed[0]
    slip = estimate is not None and figure.estimate is not None and transposed(estimate, figure.estimate)
    return Finding(key="interval-only", facts={**_facts(top[0], _methods(top)), "slip": int(slip)})


def _missed(figure: PrintedFigure, candidate: Candidate, miss: Miss) -> Finding:
    way = miss.ways[0] if miss.ways else None
    facts = _facts(
        hit(figure, candidate, way, wanted_level(figure), "estimate"), " ".join(way.key for way in miss.ways)
    )
    if miss.kind == "one-limit":
        facts |= {"limit": miss.limit, "slip": int(miss.slip)}
    return Finding(key=miss.kind, facts=facts)


def _nearest(figure: PrintedFigure, candidates: tuple[Candidate, ...]) -> Hit:
    """The figure's own measure as read, or the first that it may be, by the method that comes nearest."""
    own = next((one for one in candidates if one.named and one.orientation == "as-read"), candidates[0])
    way: Way | None = None
    if has_limits(figure):
        way = nearest_way(figure, own, (way for way in own.ways if not way.heavy))
    return hit(figure, own, way, wanted_level(figure), "estimate")


def _groups(hits: Iterable[Hit]) -> Iterator[tuple[Hit, ...]]:
    """The matches that differ in nothing but the method, in the order of the best of each."""
    groups: dict[tuple[object, ...], list[Hit]] = {}
    for one in hits:
        key = (one.match.fit, one.match.measure, one.match.orientation, one.match.level)
        groups.setdefault(key, []).append(one)
    return iter([tuple(group) for group in groups.values()])


def _methods(group: tuple[Hit, ...]) -> str:
    return " ".join(dict.fromkeys(one.match.method for one in group))


def _facts(one: Hit, methods: str) -> Facts:
    """A match as a sentence needs it; a number that is not there is left out."""
    match = one.match
    facts: Facts = {
        "measure": match.measure,
        "base": one.candidate.measure,
        "methods": methods,
        "level": match.level,
        "orientation": match.orientation,
    }
    for name, value in zip(("estimate", "low", "high"), match.computed, strict=True):
        if value is not None:
            facts[name] = value
    return facts


def _coarse(figure: PrintedFigure) -> bool:
    """Whether the estimate has so few digits that much fits it by chance: a third of random prints with one decimal."""
    return figure.estimate is not None and abs(last_digits(figure.estimate)) < _FEW_UNITS


def _otherwise(first: Hit) -> bool:
    return first.candidate.key.startswith(OTHER_ANALYSES)


def _own(figure: PrintedFigure, first: Hit, candidates: tuple[Candidate, ...]) -> Facts:
    """What the print's own measure is as read, beside a match that is something else."""
    own = next((one for one in candidates if one.named and one.orientation == "as-read"), None)
    if first.place == 0 or own is None:
        return {}
    value = hit(figure, own, None, wanted_level(figure), "estimate").match.computed[0]
    return {} if value is None else {"own_measure": own.key, "own": value}
