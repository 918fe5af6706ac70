"""Where text becomes a value. Every function here is total: it answers for any text and never raises."""
