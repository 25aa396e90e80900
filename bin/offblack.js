#!/usr/bin/env node
import '../dist/offblack.js'
