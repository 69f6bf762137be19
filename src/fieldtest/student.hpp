#pragma once

#include <cstddef>

namespace rainledger {

/// The value that Student's t of so many degrees of freedom (>= 1) stays within, either side, with
/// a chance of 95 %.
[[nodiscard]] double student_95(std::size_t degrees_of_freedom);

}  // namespace rainledger
