"""The heads of the strata's table: both groups over two columns each, and what each column counts."""

from __future__ import annotations

from PySide6.QtCore import QSize, Qt
from PySide6.QtGui import QPainter, QPaintEvent
from PySide6.QtWidgets import QGridLayout, QLabel

from fourcount.face.fields import QuietField
from fourcount.face.look import Look
from fourcount.record.outcome import Outcome
from fourcount.wording import labels

RIGHT = Qt.AlignmentFlag.AlignRight | Qt.AlignmentFlag.AlignVCenter


class ElidedLabel(QLabel):
    """A word that gives way where the column is narrow."""

    def minimumSizeHint(self) -> QSize:
        return QSize(0, super().minimumSizeHint().height())

    def paintEvent(self, _event: QPaintEvent) -> None:
        painter = QPainter(self)
        painter.setPen(self.palette().color(self.foregroundRole()))
        area = self.contentsRect()
        words = self.fontMetrics().elidedText(self.text(), Qt.TextElideMode.ElideRight, area.width())
        painter.drawText(area, self.alignment(), words)
        painter.end()


class StrataHeads:
    """Labels and headings are typed in place over the first group, and repeated over the second."""

    def __init__(self, look: Look, layout: QGridLayout) -> None:
        self._look = look
        self.labels = {
            position: QuietField(
                look, f"{position}_label_text", labels.FIELDS["label"].format(group=name), labels.HINTS["label"]
            )
            for position, name in labels.GROUP_NAMES.items()
        }
        self.headings = {
            column: QuietField(
                look, f"{column}_heading_text", labels.FIELDS["heading"].format(column=column), role="small"
            )
            for column in ("left", "right")
        }
        self.fields = (*self.labels.values(), *self.headings.values())
        self._roles = {key: QLabel() for key in ("first", "second", "left", "right")}
        self._repeated = {key: ElidedLabel() for key in ("left", "right", "all")}
        self._again = {key: QLabel() for key in ("left", "right")}
        self._all_first = QLabel(labels.ALL)
        for place, position in enumerate(("first", "second")):
            layout.addWidget(self.labels[position], 0, 1 + 2 * place, 1, 2)
            layout.addWidget(self._roles[position], 1, 1 + 2 * place, 1, 2)
        for place, column in enumerate(("left", "right"), start=1):
            layout.addWidget(self.headings[column], 2, place)
            layout.addWidget(self._roles[column], 3, place)
            layout.addWidget(self._repeated[column], 2, place + 2)
            layout.addWidget(self._again[column], 3, place + 2)
        layout.addWidget(self._all_first, 2, 2)
        layout.addWidget(self._repeated["all"], 2, 4)
        self._repeated["all"].setText(labels.ALL)
        for label in self._small():
            label.setTextFormat(Qt.TextFormat.PlainText)
            label.setAlignment(RIGHT)
        for field in self.fields:
            field.setAlignment(Qt.AlignmentFlag.AlignRight)

    def show_state(self, outcome: Outcome, of_total: bool) -> None:
        """Show the names as typed; rows of totals have no column of the other outcome."""
        for position, field in self.labels.items():
            field.show_text(getattr(outcome, f"{position}_label_text"))
            role = "index" if outcome.index_group == position else "reference"
            self._roles[position].setText(labels.ROLES[role])
        cases = "_cases" if outcome.design == "case-control" else ""
        for column, field in self.headings.items():
            field.show_text(getattr(outcome, f"{column}_heading_text"))
            field.setPlaceholderText(labels.HINTS[f"{column}_heading{cases}"])
            words = field.text().strip() or field.placeholderText()
            self._repeated[column].setText(words)
            self._repeated[column].setPalette(self._look.text_palette("ink" if field.text().strip() else "muted"))
        for column in ("left", "right"):
            self._roles[column].setText(labels.ROLES["counted"] if outcome.counted == column else "")
        if of_total and outcome.counted == "right":
            self._roles["left"].setText(labels.ROLES["others"])
            self._roles["right"].setText("")
        for column, again in self._again.items():
            again.setText(self._roles[column].text())
        for widget, shown in (
            (self.headings["right"], not of_total),
            (self._repeated["right"], not of_total),
            (self._all_first, of_total),
            (self._repeated["all"], of_total),
        ):
            widget.setVisible(shown)
        self._of_total = of_total
        for word in (*self._roles.values(), *self._again.values()):
            word.setVisible(bool(word.text()))

    def name(self, cell: str) -> str:
        """What a cell is called, without its row."""
        position, column = cell.split("_")[:2]
        group = self.labels[position].text().strip() or labels.GROUP_NAMES[position]
        heading = self.headings[column]
        words = heading.text().strip() or heading.placeholderText()
        kind = "right" if self._of_total and column == "right" else "events-and-others"
        return labels.CELL_NAMES[kind].format(group=group, outcome=words)

    def dress(self) -> None:
        """Take the size and the colour of small words."""
        for label in self._small():
            label.setFont(self._look.font("small"))
            label.setPalette(self._look.text_palette("muted"))
            label.setContentsMargins(0, 0, 0, 0)

    def _small(self) -> tuple[QLabel, ...]:
        return (*self._roles.values(), *self._repeated.values(), *self._again.values(), self._all_first)
