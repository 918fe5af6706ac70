"""The third column's parts that no first paint needs: rarer fields, the figures under them, the way to the page."""
