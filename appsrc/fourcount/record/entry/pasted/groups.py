"""Two rows of a block as two groups: which column holds the events, and which the total, the others or the time."""

from __future__ import annotations

from collections.abc import Callable, Sequence

import msgspec

from fourcount.record.entry.pasted.heading_sets import by_case, corner_says, negated, roles_of
from fourcount.record.entry.pasted.headings import Role, is_sum, role_of, time_unit
from fourcount.record.entry.pasted.matrix import Matrix
from fourcount.record.entry.pasted.percentages import percentages
from fourcount.record.entry.pasted.proportions import gives, nearly_gives
from fourcount.record.entry.pasted.proven import proven_total
from fourcount.record.entry.pasted.quantities import Quantity
from fourcount.record.entry.pasted.understood import Understood, agrees
from fourcount.record.entry.tokens import Token
from fourcount.record.outcome import Form

_MEASURES = ("total", "others", "percent", "time", "rate", "events")


def two_groups(matrix: Matrix) -> Understood | None:
    """The two rows of a matrix as two groups; None where its columns make no table."""
    if len(matrix.rows) != 2:
        return None
    score = 0
    roles = roles_of(matrix.heads)
    labels = [role_of(label.label) for label in matrix.labels]
    states = {"events", "others"}
    if negated(matrix.labels) and (not any(head.label for head in matrix.heads) or states <= set(roles)):
        labels = []
    if negated(matrix.heads) and states <= set(labels):
        roles = ["unknown"] * len(roles)
    score -= 6 * any(role in ("time", "percent") for role in labels)
    told = not negated(matrix.heads) or any(label.label for label in matrix.labels)
    roles = roles if told else ["unknown"] * len(roles)
    score += 3 * any(role in _MEASURES for role in roles) - 3 * any(role in _MEASURES for role in labels)
    score += 3 * all(label.total for label in matrix.labels) + any(label.label for label in matrix.labels)
    score -= 3 * any(head.total for head in matrix.heads)
    sampled = by_case(matrix.heads)
    score += 6 * sampled - 6 * by_case(matrix.labels) + 2 * corner_says(matrix.corner)
    score -= 6 * (any(is_sum(head.label) for head in matrix.heads) and not any(label.label for label in matrix.labels))
    found = _complete(matrix) or _counted(matrix, roles) or percentages(matrix, roles)
    if found is None:
        return None
    pair = found.quantities
    checked = [each for each in pair if each.percent and each.events and (each.total or found.others)]
    agreeing = len(checked) if sampled else sum(agrees(each, found) for each in checked)
    doubts = found.doubts + (("percent-disagrees",) if agreeing < len(checked) else ())
    doubts += ("left-out",) if _left_out(matrix, found) else ()
    score += found.score + agreeing - 2 * (len(checked) - agreeing)
    if sampled:
        pair = (msgspec.structs.replace(pair[0], percent=None), msgspec.structs.replace(pair[1], percent=None))
        found = msgspec.structs.replace(found, quantities=pair)
    names = (matrix.labels[0].label, matrix.labels[1].label)
    return msgspec.structs.replace(found, labels=names, doubts=doubts, score=score)


def _left_out(matrix: Matrix, found: Understood) -> bool:
    """Whether a column of numbers with decimals or percentages is neither used nor what the counts give."""
    if found.form == "percent-of-total":
        return False
    for column in range(len(matrix.heads)):
        percents = [row[column].percent for row in matrix.rows]
        pairs = zip(found.quantities, percents, strict=True)
        if all(percents) and not all(agrees(msgspec.structs.replace(each, percent=one), found) for each, one in pairs):
            return True
    return False


def _complete(matrix: Matrix) -> Understood | None:
    """Columns whose every cell holds a whole group: ``38/412``, ``38 of 412``, ``38/4120 py``, ``9% (6-12)``."""
    whole = [place for place in range(len(matrix.heads)) if all(_whole(row[place].quantity) for row in matrix.rows)]
    if not whole:
        return None
    first, second = (row[whole[0]].quantity for row in matrix.rows)
    if first is None or second is None or _kind(first) != _kind(second):
        return None
    doubts = ("several-rows",) if len(whole) > 1 else ()
    form: Form = "events-of-total"
    unit = time_unit(matrix.heads[whole[0]].label)
    if unit and first.events and not first.time:
        first, second = (
            msgspec.structs.replace(each, time=each.total, total=None, unit=unit) for each in (first, second)
        )
    if first.time:
        form = "person-time"
    elif first.events is None:
        form = "risk-at-time" if first.low else "percent-of-total"
    return Understood(
        form=form,
        quantities=(first, second),
        labels=("", ""),
        left_heading=matrix.heads[whole[0]].label,
        unit=first.unit or second.unit,
        doubts=doubts,
        score=3 - len(whole),
    )


def _over_time(quantity: Quantity, unit: str) -> Quantity:
    return msgspec.structs.replace(quantity, time=quantity.total, total=None, unit=unit)


def _whole(quantity: Quantity | None) -> bool:
    return quantity is not None and quantity.complete


def _kind(quantity: Quantity) -> tuple[bool, bool, bool]:
    return quantity.events is not None, quantity.time is not None, quantity.low is not None


def _counted(matrix: Matrix, roles: Sequence[Role]) -> Understood | None:
    """Columns of counts, told apart by their headings, else by sums, else by their order."""
    amounts = [place for place in range(len(matrix.heads)) if all(row[place].amount for row in matrix.rows)]
    timed = [place for place in amounts if roles[place] == "time" or _unit(matrix, place)]
    columns = [place for place in amounts if all(row[place].count for row in matrix.rows)]
    columns = [place for place in columns if not (is_sum(matrix.heads[place].label) and roles[place] != "total")]
    if not columns:
        return None
    if timed:
        events = [place for place in columns if place not in timed and roles[place] != "total"]
        return _timed(matrix, events, timed[0])
    totals = [label.total for label in matrix.labels]
    if all(totals) and (found := _of_printed_totals(matrix, columns, roles, totals)):
        return found
    if len(columns) == 1:
        return _without_totals(matrix, columns[0])
    found = _by_roles(matrix, columns, roles) or _by_order(matrix, columns)
    proven = proven_total(matrix, columns)
    if proven is None or (found and all(agrees(each, found) for each in found.quantities)):
        return found
    pair = _with_totals(matrix, proven[0], _tokens(matrix, proven[1]))
    heading = matrix.heads[proven[0]].label
    doubts = ("left-out",) if len(columns) > 2 else ()
    return pair and Understood(
        form="events-of-total", quantities=pair, labels=("", ""), left_heading=heading, doubts=doubts, score=4
    )


def _unit(matrix: Matrix, column: int) -> bool:
    return any(quantity.unit for row in matrix.rows if (quantity := row[column].quantity))


def _timed(matrix: Matrix, events: Sequence[int], time: int) -> Understood | None:
    if not events:
        return None
    cells = [(row[events[0]].quantity, row[time].quantity) for row in matrix.rows]
    pair = [msgspec.structs.replace(one, time=two.events) for one, two in cells if one and two]
    unit = next((two.unit for _, two in cells if two and two.unit), "") or _spelled_unit(matrix.heads[time].label)
    doubts = () if unit else ("rates-unchecked",)
    return Understood(
        form="person-time",
        quantities=(pair[0], pair[1]),
        labels=("", ""),
        left_heading=matrix.heads[events[0]].label,
        unit=unit,
        doubts=doubts,
        score=3,
    )


def _spelled_unit(heading: str) -> str:
    return heading.strip() if heading[:1].isupper() and heading[1:2].isupper() else heading.strip().lower()


def _of_printed_totals(
    matrix: Matrix, columns: Sequence[int], roles: Sequence[Role], totals: Sequence[Token | None]
) -> Understood | None:
    """Counts under totals such as "(n = 412)"; the first column of events is taken."""
    named = [place for place in columns if roles[place] not in ("total", "others")] or list(columns)
    pair = _with_totals(matrix, named[0], totals)
    if pair is None:
        return None
    more = [place for place in columns if place != named[0] and roles[place] not in ("total", "others")]
    more = [place for place in more if not _sums(matrix, named[0], place, totals)]
    return Understood(
        form="events-of-total",
        quantities=pair,
        labels=("", ""),
        left_heading=matrix.heads[named[0]].label,
        doubts=("several-rows",) if more else (),
        score=2,
    )


def _sums(matrix: Matrix, one: int, other: int, totals: Sequence[Token | None]) -> bool:
    """Whether two columns are the two outcomes of everybody in each group."""
    return all(
        _count(matrix, row, one) + _count(matrix, row, other) == (total.whole if total else -1)
        for row, total in enumerate(totals)
    )


def _with_totals(matrix: Matrix, events: int, totals: Sequence[Token | None]) -> tuple[Quantity, Quantity] | None:
    pair = []
    for row, total in enumerate(totals):
        quantity = matrix.rows[row][events].quantity
        if quantity is None or total is None or _count(matrix, row, events) > (total.whole or 0):
            return None
        pair.append(msgspec.structs.replace(quantity, total=total))
    return pair[0], pair[1]


def _count(matrix: Matrix, row: int, column: int) -> int:
    token = matrix.rows[row][column].count
    return (token.whole or 0) if token else 0


def _tokens(matrix: Matrix, column: int) -> list[Token | None]:
    return [row[column].count for row in matrix.rows]


def _without_totals(matrix: Matrix, column: int) -> Understood | None:
    """Counts with percentages alone: the totals stay open."""
    one, two = (row[column].quantity for row in matrix.rows)
    if one is None or two is None or one.percent is None or two.percent is None:
        return None
    heading = matrix.heads[column].label
    return Understood(
        form="events-of-total", quantities=(one, two), labels=("", ""), left_heading=heading, doubts=("no-totals",)
    )


def _by_roles(matrix: Matrix, columns: Sequence[int], roles: Sequence[Role]) -> Understood | None:
    """Events and total, or events and others, where a heading says which is which."""
    events = [place for place in columns if roles[place] == "events"]
    named = events or [place for place in columns if roles[place] == "unknown"]
    totals = [place for place in columns if roles[place] == "total" and place not in named[:1]]
    others = [place for place in columns if roles[place] == "others"]
    if named and others and (not totals or _sums(matrix, named[0], others[0], _tokens(matrix, totals[0]))):
        doubts = ("total-left-out",) if totals else ()
        return _two_outcomes(matrix, named[0], others[0], score=4, doubts=doubts)
    if not named or not totals:
        return None
    several = len({tuple(token.whole for token in _tokens(matrix, place) if token) for place in totals}) > 1
    totals = totals[-1:] if several else totals
    pair = _with_totals(matrix, named[0], _tokens(matrix, totals[0]))
    if pair is None:
        return None
    second = [place for place in named[1:] if _sums(matrix, named[0], place, _tokens(matrix, totals[0]))]
    if second:
        return _two_outcomes(matrix, named[0], second[0], score=4, doubts=("total-left-out",))
    return Understood(
        form="events-of-total",
        quantities=pair,
        labels=("", ""),
        left_heading=matrix.heads[named[0]].label,
        doubts=(("several-rows",) if len(named) > 1 and len(events) != 1 else ()) + (("left-out",) if several else ()),
        score=4,
    )


def _two_outcomes(
    matrix: Matrix, events: int, others: int, *, score: int, doubts: tuple[str, ...] = ()
) -> Understood | None:
    one, two = (row[events].quantity for row in matrix.rows)
    apart = tuple(token for token in _tokens(matrix, others) if token)
    if one is None or two is None or len(apart) != 2:
        return None
    return Understood(
        form="events-and-others",
        quantities=(one, two),
        labels=("", ""),
        left_heading=matrix.heads[events].label,
        right_heading=matrix.heads[others].label,
        doubts=doubts,
        score=score,
        others=apart,
    )


def _by_order(matrix: Matrix, columns: Sequence[int]) -> Understood | None:
    """Counts without telling headings: a sum shows the total, a percentage what it is of, else two outcomes."""
    if len(columns) >= 3:
        for one, other, whole in ((0, 1, 2), (0, 2, 1), (1, 2, 0)):
            first, second, total = columns[one], columns[other], columns[whole]
            if _sums(matrix, first, second, _tokens(matrix, total)):
                return _two_outcomes(matrix, first, second, score=3, doubts=("total-left-out",))
        return None
    events, second = columns
    together = _percent_fits(matrix, events, second, gives, together=True)
    alone = _percent_fits(matrix, events, second, gives, together=False)
    for first, other in ((events, second), (second, events)):
        fits = any(_percent_fits(matrix, first, other, judge, together=False) for judge in (gives, nearly_gives))
        if fits and not together and (pair := _with_totals(matrix, first, _tokens(matrix, other))):
            heading = matrix.heads[first].label
            return Understood(form="events-of-total", quantities=pair, labels=("", ""), left_heading=heading, score=3)
    told = all(matrix.heads[place].label for place in columns)
    above = [_count(matrix, row, events) - _count(matrix, row, second) for row in (0, 1)]
    surely = told or min(above) < 0 < max(above)
    surely = surely or (not alone and _percent_fits(matrix, events, second, nearly_gives, together=True))
    return _two_outcomes(matrix, events, second, score=1, doubts=() if surely else ("others-or-totals",))


def _percent_fits(
    matrix: Matrix, events: int, other: int, judge: Callable[[Token, int, int], bool], *, together: bool
) -> bool:
    """Whether the percentages beside one column are what it gives of the other, or of both together."""
    for row in range(2):
        quantity = matrix.rows[row][events].quantity
        if quantity is None or quantity.percent is None:
            return False
        part, whole = _count(matrix, row, events), _count(matrix, row, other)
        if not judge(quantity.percent, part, part + whole if together else whole):
            return False
        if part > whole and not together:
            return False
    return True
