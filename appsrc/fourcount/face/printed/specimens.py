"""How a list with notes is painted: the choice, and what it stands for in muted words at the right."""

from __future__ import annotations

from collections.abc import Mapping

from PySide6.QtCore import QModelIndex, QPersistentModelIndex, QSize, Qt
from PySide6.QtGui import QFontMetrics, QPainter
from PySide6.QtWidgets import QComboBox, QStyle, QStyledItemDelegate, QStyleOptionViewItem

from fourcount.face.look import Look

Index = QModelIndex | QPersistentModelIndex


class SpecimenDelegate(QStyledItemDelegate):
    """Paints a specimen and its note on one line."""

    def __init__(self, look: Look, box: QComboBox) -> None:
        super().__init__(box)
        self._look = look

    def sizeHint(self, _option: QStyleOptionViewItem, index: Index) -> QSize:
        return QSize(self._width(index.data(), index.data(Qt.ItemDataRole.StatusTipRole)), self._look.px(28))

    def paint(self, painter: QPainter, option: QStyleOptionViewItem, index: Index) -> None:
        look, pad = self._look, self._look.px(10)
        area = option.rect.adjusted(pad, 0, -pad, 0)
        chosen = bool(option.state & QStyle.StateFlag.State_Selected)
        middle = Qt.AlignmentFlag.AlignVCenter
        painter.save()
        painter.fillRect(option.rect, look.colour("tint" if chosen else "page"))
        if chosen:
            painter.fillRect(option.rect.adjusted(0, 0, 3 - option.rect.width(), 0), look.colour("accent"))
        painter.setFont(look.font("body"))
        painter.setPen(look.colour("ink"))
        painter.drawText(area, Qt.AlignmentFlag.AlignLeft | middle, index.data())
        painter.setFont(look.font("small"))
        painter.setPen(look.colour("muted"))
        painter.drawText(area, Qt.AlignmentFlag.AlignRight | middle, index.data(Qt.ItemDataRole.StatusTipRole))
        painter.restore()

    def _width(self, specimen: str, note: str) -> int:
        body, small = QFontMetrics(self._look.font("body")), QFontMetrics(self._look.font("small"))
        return body.horizontalAdvance(specimen) + small.horizontalAdvance(note) + self._look.px(48 if note else 24)


def show_notes(box: QComboBox, look: Look, notes: Mapping[str, str]) -> None:
    """Give each entry of a list its note, and the list the width that both need."""
    if not isinstance(box.itemDelegate(), SpecimenDelegate):
        for index in range(box.count()):
            note = notes.get(box.itemData(index), "")
            box.setItemData(index, note, Qt.ItemDataRole.StatusTipRole)
            if note:
                box.setItemData(index, f"{box.itemText(index)}, {note}", Qt.ItemDataRole.AccessibleTextRole)
        box.setItemDelegate(SpecimenDelegate(look, box))
    box.view().setMinimumWidth(max(box.view().sizeHintForColumn(0), box.width()))
