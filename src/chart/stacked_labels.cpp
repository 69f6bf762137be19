#include "chart/stacked_labels.hpp"

#include <algorithm>

namespace rainledger {

void spread(std::vector<StackedLabel>& labels, double bottom, double top, double distance) {
    double least = bottom;
    for (StackedLabel& label : labels) {
        label.y = std::max(label.y, least);
        least = label.y + distance;
    }
    double most = top;
    for (auto label = labels.rbegin(); label != labels.rend(); ++label) {
        label->y = std::min(label->y, most);
        most = label->y - distance;
    }
}

}  // namespace rainledger
