"""A paste's understanding as a few lines of text, as the files in record/pasted hold it."""

from __future__ import annotations

from pathlib import Path

from fourcount.record.entry.readings import Pasted, PrintedFigure

FOLDER = Path(__file__).resolve().parent / "record" / "pasted"
TAB = "\u2192"
"""Stands for a tab in the files, where nobody would see one."""


def described(pasted: Pasted | None) -> list[str]:
    """Everything that is not as usual in a paste, a line for each."""
    if pasted is None:
        return ["none"]
    lines = [f"{pasted.source}: {pasted.form}"]
    lines += [f"group: {group.left_text} | {group.right_text} | {group.label}".rstrip() for group in pasted.groups]
    if pasted.stratum_labels:
        lines.append("strata: " + " | ".join(pasted.stratum_labels))
    lines += [
        f"{name}: {value}"
        for name in ("left_heading", "right_heading", "words", "unit", "span", "limits_level", "paper_text")
        if (value := getattr(pasted, name))
    ]
    if pasted.layout == "across":
        lines.append("across")
    if not pasted.strata_of_total:
        lines.append("strata of events and others")
    lines += [f"figure: {figure_line(figure)}" for figure in pasted.figures]
    lines += [f"ambiguous: {key}" for key in pasted.ambiguous]
    return lines


def figure_line(figure: PrintedFigure) -> str:
    """A figure as ``risk_ratio 0.54 [0.37 0.78] 95% p=0.001 adjusted``."""
    pieces = [figure.measure]
    if figure.estimate:
        pieces.append(figure.estimate.text)
    if figure.low and figure.high:
        pieces.append(f"[{figure.low.text} {figure.high.text}]")
    if figure.level:
        pieces.append(f"{100 * figure.level:g}%")
    if figure.p:
        pieces.append(f"p{figure.p_relation}{figure.p.text}")
    return " ".join(
        [*pieces, *([figure.unit] if figure.unit != "one" else []), *(["adjusted"] if figure.adjusted else [])]
    )


def cases(name: str) -> list[tuple[str, list[str]]]:
    """The texts of a file with what each is understood as; "====" parts cases, "----" a text from its lines."""
    text = (FOLDER / name).read_text(encoding="utf-8").replace(TAB, "\t")
    found = []
    for case in text.split("\n====\n")[1:]:
        printed, _, expected = case.partition("\n----\n")
        found.append((printed, expected.strip("\n").split("\n")))
    return found
