/// <reference lib="dom" />
