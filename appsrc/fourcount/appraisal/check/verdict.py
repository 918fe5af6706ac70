"""From the matches of one printed figure to what is said of it, in the order in which it is said."""

from __future__ import annotations

from collections.abc import Iterable, Iterator, Sequence

from fourcount.appraisal.check.candidate import Candidate, Way
from fourcount.appraisal.check.digits import coarse, transposed
from fourcount.appraisal.check.misses import Miss, near_miss
from fourcount.appraisal.check.search import OTHER_ANALYSES, Hit, has_limits, hit, nearest_way, wanted_level
from fourcount.appraisal.check.shown import Shown
from fourcount.appraisal.check.symmetry import Triple, mirrored_limit, ordered, slips, symmetric, triple_of
from fourcount.appraisal.findings.check import Finding
from fourcount.record.entry.readings import PrintedFigure
from fourcount.stats.results import Fact

Facts = dict[str, Fact]

LAST_RESORTS = ("nearest", "not-given", "adjusted")
"""What is said last, behind what the print says of itself."""
WHOLE = ("reproduced", "other-name", "other-way-round", "other-name-and-way")
ESTIMATE = ("estimate-only", "estimate-other-name", "estimate-other-way", "estimate-other-name-and-way")
FALLBACKS = {"katz": "walter", "woolf": "gart"}
"""Whose interval stands in for a method's where a count is 0."""
_MOST_OTHERS = 3


def effect_findings(
    figure: PrintedFigure, hits: tuple[Hit, ...], candidates: tuple[Candidate, ...], shown: Shown, *, heavy: bool
) -> tuple[Finding, ...]:
    """What the counts say of the estimate and its limits, then what the limits say of themselves."""
    if figure.measure == "hazard_ratio" and candidates:
        return (_no_hazard_ratio(figure, hits, candidates, shown), *symmetry_findings(figure, alone=True))
    found = tuple(_from_counts(figure, hits, candidates, shown, heavy=heavy))
    whole = bool(hits) and hits[0].match.fit == "all"
    told = whole or any(finding.key in ("one-limit", "interval-only", "cut-off", "last-digit") for finding in found)
    symmetry = () if told else symmetry_findings(figure, alone=not candidates)
    last = found[-1:] if found and found[-1].key in LAST_RESORTS else ()
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
    figure: PrintedFigure, hits: tuple[Hit, ...], candidates: tuple[Candidate, ...], shown: Shown, *, heavy: bool
) -> Iterator[Finding]:
    if not candidates:
        return
    if not hits:
        yield from _nothing_fits(figure, candidates, shown, heavy=heavy)
    elif hits[0].match.fit == "all" or (hits[0].match.fit == "interval" and figure.estimate is None):
        yield from _whole(figure, hits, candidates, shown)
    elif hits[0].match.fit == "interval":
        yield _near(figure, candidates, heavy=heavy) or _interval_only(figure, hits)
    else:
        yield from _estimate_alone(figure, hits, candidates, shown, heavy=heavy)


def _no_hazard_ratio(
    figure: PrintedFigure, hits: tuple[Hit, ...], candidates: tuple[Candidate, ...], shown: Shown
) -> Finding:
    """No table gives a hazard ratio: what it gives instead, and whether that happens to be the print."""
    top = next(_groups(hits), ())
    if top and top[0].rank[0] == 0 and top[0].candidate.as_printed:
        return Finding(key="no-hazard-ratio", facts={**_facts_of(top, shown), "fits": 1}, agrees=True)
    own = candidates[0]
    way = shown.way(own, wanted_level(figure)) or next(iter(own.ways), None)
    nearest = hit(figure, own, way, wanted_level(figure), "estimate")
    return Finding(key="no-hazard-ratio", facts=_facts_of((nearest,), shown), agrees=True)


def _whole(
    figure: PrintedFigure, hits: tuple[Hit, ...], candidates: tuple[Candidate, ...], shown: Shown
) -> Iterator[Finding]:
    top, *rest = _groups(hits)
    first = top[0]
    facts = {**_facts_of(top, shown), **_own(figure, first, candidates, shown), "coarse": int(_coarse(figure))}
    if figure.adjusted and first.at_level and first.place == 0:
        yield Finding(key="adjusted-is-crude", facts=facts)
        return
    if first.at_level:
        key = "other-analysis" if _otherwise(first) else WHOLE[first.place]
        if key == "reproduced" and first.candidate.sign_alone:
            key = "other-sign"
        yield Finding(key=key, facts=facts, agrees=first.place == 0)
    else:
        printed: Facts = {} if figure.level is None else {"printed_level": figure.level}
        yield Finding(key="other-level", facts={**facts, **printed, "place": first.place})
    if first.place or not first.at_level:
        most = first.rank[0] if _otherwise(first) else 1
        whole = [group for group in rest if group[0].rank[0] <= most]
        for group in whole[:_MOST_OTHERS]:
            yield Finding(key="also-fits", facts=_facts_of(group))


def _estimate_alone(
    figure: PrintedFigure, hits: tuple[Hit, ...], candidates: tuple[Candidate, ...], shown: Shown, *, heavy: bool
) -> Iterator[Finding]:
    first = hits[0]
    if figure.adjusted:
        yield _adjusted(first)
        return
    miss = near_miss(figure, first.candidate, heavy=heavy)
    if miss is not None and first.place == 0:
        yield _missed(figure, first.candidate, miss)
        return
    facts = {**_facts_of((first,), shown), **_own(figure, first, candidates, shown), **_as_shown(figure, first, shown)}
    yield Finding(key="estimate-other-analysis" if _otherwise(first) else ESTIMATE[first.place], facts=facts)


def _as_shown(figure: PrintedFigure, first: Hit, shown: Shown) -> Facts:
    """The limits that the window shows of a match by another method."""
    way = shown.way(first.candidate, wanted_level(figure))
    if way is None or way.key == first.match.method:
        return {}
    own = hit(figure, first.candidate, way, wanted_level(figure), "estimate")
    facts = _facts_of((own,))
    return {f"shown_{name}": facts[name] for name in ("methods", "halved", "low", "high") if "low" in facts}


def _nothing_fits(
    figure: PrintedFigure, candidates: tuple[Candidate, ...], shown: Shown, *, heavy: bool
) -> Iterator[Finding]:
    nearest = _nearest(figure, candidates, shown)
    if figure.adjusted:
        yield _adjusted(nearest)
        return
    near = _near(figure, candidates, heavy=heavy)
    key = "nearest" if nearest.match.computed[0] is not None else "not-given"
    yield near or Finding(key=key, facts=_facts_of((nearest,), shown))


def _adjusted(crude: Hit) -> Finding:
    return Finding(key="adjusted", facts={**_facts_of((crude,)), "methods": ""}, agrees=True)


def _near(figure: PrintedFigure, candidates: tuple[Candidate, ...], *, heavy: bool) -> Finding | None:
    """A near miss of the print's own measure as read, where no estimate fits."""
    for candidate in candidates:
        if candidate.heavy or not candidate.named or not candidate.as_printed:
            continue
        miss = near_miss(figure, candidate, heavy=heavy)
        if miss is not None:
            return _missed(figure, candidate, miss)
    return None


def _interval_only(figure: PrintedFigure, hits: tuple[Hit, ...]) -> Finding:
    top = next(_groups(hits))
    estimate = top[0].match.computed[0]
    slip = estimate is not None and figure.estimate is not None and transposed(estimate, figure.estimate)
    return Finding(key="interval-only", facts={**_facts_of(top), "slip": int(slip)})


def _missed(figure: PrintedFigure, candidate: Candidate, miss: Miss) -> Finding:
    facts = _facts_of([hit(figure, candidate, way, wanted_level(figure), "estimate") for way in miss.ways or (None,)])
    if miss.kind == "one-limit":
        facts |= {"limit": miss.limit, "slip": int(miss.slip)}
    return Finding(key=miss.kind, facts=facts)


def _nearest(figure: PrintedFigure, candidates: tuple[Candidate, ...], shown: Shown) -> Hit:
    """The figure's own measure, or the first that it may be, by the method shown, or else by that which comes nearest.

    A difference is seen with the sign that is printed.
    """
    own = next((one for one in candidates if one.named and one.orientation == "as-read"), candidates[0])
    if _other_sign(figure, own):
        own = next((one for one in candidates if one.named and one.sign_alone), own)
    way: Way | None = None
    if has_limits(figure):
        way = shown.way(own, wanted_level(figure))
        if way is None or own.limits(way, wanted_level(figure)) is None:
            way = nearest_way(figure, own, (way for way in own.ways if not way.heavy))
    return hit(figure, own, way, wanted_level(figure), "estimate")


def _groups(hits: Iterable[Hit]) -> Iterator[tuple[Hit, ...]]:
    """The matches that differ in nothing but the method, in the order of the best of each."""
    groups: dict[tuple[object, ...], list[Hit]] = {}
    for one in hits:
        key = (one.match.fit, one.match.measure, one.match.orientation, one.match.level)
        groups.setdefault(key, []).append(one)
    return iter([tuple(group) for group in groups.values()])


def _other_sign(figure: PrintedFigure, candidate: Candidate) -> bool:
    """Whether a figure has the sign that is not printed."""
    printed, value = figure.estimate or figure.low, candidate.value()
    return printed is not None and value is not None and printed.value * value < 0


def _facts_of(group: Sequence[Hit], shown: Shown | None = None) -> Facts:
    """Matches that differ in the method alone, as a sentence needs them; a number that is not there is left out.

    The method that the window shows stands first, and ``shown`` says so. ``halved`` is the method whose intervals
    others fall back on where a count is 0.
    """
    one, match = group[0], group[0].match
    way = None if shown is None else shown.way(one.candidate, match.level)
    group = sorted(group, key=lambda hit: way is None or hit.match.method != way.key)
    halved = {FALLBACKS[hit.match.method] for hit in group if hit.match.adjusted and hit.match.method in FALLBACKS}
    facts: Facts = {
        "measure": match.measure,
        "base": one.candidate.measure,
        "methods": " ".join(dict.fromkeys(_key(hit) for hit in group)),
        "halved": "".join(halved),
        "shown": int(way is not None and group[0].match.method == way.key),
        "level": match.level,
        "orientation": match.orientation,
    }
    for name, value in zip(("estimate", "low", "high"), match.computed, strict=True):
        if value is not None:
            facts[name] = value
    return facts


def _key(one: Hit) -> str:
    """The method whose interval it is: Walter's or Gart's where a half was added because of a zero."""
    return FALLBACKS.get(one.match.method, one.match.method) if one.match.adjusted else one.match.method


def _coarse(figure: PrintedFigure) -> bool:
    """Whether the estimate has so few digits that much fits it by chance: a third of random prints with one decimal."""
    return figure.estimate is not None and coarse(figure.estimate)


def _otherwise(first: Hit) -> bool:
    return first.candidate.key.startswith(OTHER_ANALYSES)


def _own(figure: PrintedFigure, first: Hit, candidates: tuple[Candidate, ...], shown: Shown) -> Facts:
    """What the print's own measure is as read, beside a match of another; its limits beside another analysis."""
    own = next((one for one in candidates if one.named and one.orientation == "as-read"), None)
    if first.place == 0 or own is None:
        return {}
    level = first.match.level
    way = (shown.way(own, level) or next(iter(own.ways), None)) if _otherwise(first) and has_limits(figure) else None
    value, low, high = hit(figure, own, way, level, "estimate").match.computed
    if value is None:
        return {}
    facts: Facts = {"own_measure": own.key, "own": value}
    return facts if low is None or high is None else {**facts, "own_low": low, "own_high": high}
