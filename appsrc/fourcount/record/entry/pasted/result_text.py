"""A printed result put together from a table: its heading and its cell as one text."""

from __future__ import annotations

import re

from fourcount.record.entry.pasted.cells import Cell
from fourcount.record.entry.pasted.headings import Role

_INTERVAL = re.compile(r"[(\[,; ]*([0-9.]+ ?% ?-?(?:CI|CrI|confidence interval)s?)[)\] ]*", re.IGNORECASE)
_OTHER_P = re.compile("interaction|trend|heterogeneity", re.IGNORECASE)
_BRACKET = re.compile(r"[(\[]")


def named_result(head: str, role: Role, cell: Cell) -> str:
    """A result behind its name, with the level of its heading inside its bracket."""
    text = cell.result or cell.text
    text += ")" if "(" in text and ")" not in text else ""
    if role == "p" or text.startswith("P "):
        number = text.removeprefix("P ").removeprefix("p ").strip()
        return f"P {number}" if number[:1] in "<>=" else (number if number[:1] in "pP" else f"P = {number}")
    interval = _INTERVAL.search(head)
    name = _INTERVAL.sub(" ", head).strip(" ,;:")
    if interval:
        text = _BRACKET.sub(lambda match: f"{match[0]}{interval[1]} ", text, count=1)
    return f"{name} {text}".strip()


def add_result(texts: list[str], head: str, role: Role, cell: Cell) -> None:
    """Put a result to the others; limits that stand in a column or a line of their own belong to the one before."""
    if _OTHER_P.search(head):
        return
    if not cell.limits:
        texts.append(named_result(head, role, cell))
    elif texts and not texts[-1].endswith(")") and not texts[-1].startswith(("P ", "p ")):
        level = _INTERVAL.search(head)
        texts[-1] += f" ({level[1]} {cell.result})" if level else f" ({cell.result})"
