#include "rainledger/reference/composite_number.hpp"

#include "reference/sources.hpp"

namespace rainledger {
namespace {

constexpr Provenance kFigure23{&sources::kTr55, "figure 2-3 as equation", Status::from_memory};
constexpr Provenance kFigure24{&sources::kTr55, "figure 2-4 as equation", Status::from_memory};

bool is_share(double value) {
    return value >= 0.0 && value <= 1.0;
}

}  // namespace

Answer<CompositeNumber> composite_number(const PartlyImpervious& area) {
    if (!(area.pervious_number > 0.0 && area.pervious_number <= 100.0))
        return refusal<CompositeNumber>(
            "the curve number of the pervious part must be above 0 and at most 100");
    if (!is_share(area.impervious_share))
        return refusal<CompositeNumber>("the impervious share must lie between 0 and 1");
    if (!is_share(area.connected_share))
        return refusal<CompositeNumber>("the connected share must lie between 0 and 1");
    const double rise = area.impervious_share * (kImperviousNumber - area.pervious_number);
    if (area.connected_share == 1.0 || area.impervious_share >= kLeastShareAsConnected)
        return {CompositeNumber{area.pervious_number + rise, kFigure23}, {}, {}};
    const double unconnected_share = 1.0 - area.connected_share;
    return {
        CompositeNumber{area.pervious_number + rise * (1.0 - 0.5 * unconnected_share), kFigure24},
        {},
        {}};
}

}  // namespace rainledger
