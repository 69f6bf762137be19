#pragma once

#include <span>
#include <string_view>

#include "rainledger/reference/answer.hpp"
#include "rainledger/reference/provenance.hpp"
#include "rainledger/reference/published_value.hpp"

// Published depression storage and surface retention, in depth over the surface.
namespace rainledger {

/// What a published depth holds.
enum class StorageKind {
    depression,  ///< depressions alone
    retention,   ///< all losses at the surface together: interception and depressions
};

/// "depression storage", "surface retention".
[[nodiscard]] std::string_view storage_kind_name(StorageKind kind);

/// A row. A source that gives a range alone has no value.
struct StorageRow {
    std::string_view name;
    StorageKind kind = StorageKind::depression;
    PublishedValue depth_mm;
    std::string_view printed_unit;  ///< "in"
    Provenance provenance;
    std::string_view note = {};
};

[[nodiscard]] std::span<const StorageRow> storage_rows();
[[nodiscard]] RowView view_of(const StorageRow& row);

/// Depression storage of a paved surface on a slope: 0.77 S^-0.49 mm, S in percent (Kidd 1978,
/// from memory). A slope that is not above 0, or not finite, is refused.
[[nodiscard]] Answer<double> paved_depression_storage_mm(double slope_percent);
[[nodiscard]] const Provenance& paved_depression_provenance();

}  // namespace rainledger
