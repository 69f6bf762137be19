#pragma once

#include <string>
#include <string_view>
#include <vector>

namespace rainledger {

/// A label beside a band.
struct StackedLabel {
    double y = 0.0;
    std::string words;
    std::string_view colour;
};

/// Moves labels that rise in y apart to at least `distance`, within `bottom` to `top`, each as
/// little as the others allow.
void spread(std::vector<StackedLabel>& labels, double bottom, double top, double distance);

}  // namespace rainledger
