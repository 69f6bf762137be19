#pragma once

// The one place that knows which release of the test library this is.
#include <catch2/catch.hpp>

using Catch::Matchers::Contains;
using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
