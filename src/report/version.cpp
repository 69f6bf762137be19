#include "rainledger/report/version.hpp"

namespace rainledger {

std::string_view version() {
    return RAINLEDGER_VERSION;
}

}  // namespace rainledger
