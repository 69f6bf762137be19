#pragma once

#include "scenario/schema_values.hpp"

// The JSON Schema of a storm.
namespace rainledger {

/// The definitions of `storm`, `from_record` and of the maps in them.
[[nodiscard]] Json storm_definitions();

}  // namespace rainledger
