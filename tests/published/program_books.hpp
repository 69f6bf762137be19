#pragma once

#include "published/storm_books.hpp"

namespace rainledger::published {

/// The books as the program writes them: it is run on the storm's scenario, and its ledger and JSON
/// are read back. Throws std::runtime_error when it fails or its files are not as they should be.
[[nodiscard]] StormBooks program_books(const StoredStorm& storm);

}  // namespace rainledger::published
